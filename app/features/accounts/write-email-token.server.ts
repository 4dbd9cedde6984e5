import { emailTokens, type EmailTokenPayload, type EmailTokenPurpose } from "#app/db/schema/index.ts";
import type { LaboratoryId, UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { hashToken, newToken } from "./token.server.ts";

type NewEmailToken = {
  purpose: EmailTokenPurpose;
  email: string;
  userId?: UserId;
  laboratoryId?: LaboratoryId;
  createdBy?: UserId;
  payload?: EmailTokenPayload;
  validMs: number;
};

/** @returns the token for the link: its only copy */
export async function writeEmailToken({ db, now }: Pick<AppContext, "db" | "now">, { validMs, payload = {}, ...token }: NewEmailToken): Promise<string> {
  const text = newToken();
  await db.insert(emailTokens).values({ ...token, payload, tokenHash: hashToken(text), createdAt: now, expiresAt: new Date(now.getTime() + validMs) });
  return text;
}
