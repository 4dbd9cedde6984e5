import { and, eq, gt, inArray, isNull } from "drizzle-orm";
import { emailTokens, type EmailTokenPurpose } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { hashToken } from "./token.server.ts";

/** What a link is about, while it is good; reading does not use it up. */
export async function findEmailToken({ db, now }: Pick<AppContext, "db" | "now">, { token, purposes }: { token: string; purposes: readonly EmailTokenPurpose[] }) {
  const [row] = await db
    .select({
      purpose: emailTokens.purpose,
      email: emailTokens.email,
      userId: emailTokens.userId,
      laboratoryId: emailTokens.laboratoryId,
      createdBy: emailTokens.createdBy,
      payload: emailTokens.payload,
    })
    .from(emailTokens)
    .where(and(eq(emailTokens.tokenHash, hashToken(token)), inArray(emailTokens.purpose, [...purposes]), isNull(emailTokens.usedAt), gt(emailTokens.expiresAt, now)));
  return row;
}

export type FoundEmailToken = NonNullable<Awaited<ReturnType<typeof findEmailToken>>>;
