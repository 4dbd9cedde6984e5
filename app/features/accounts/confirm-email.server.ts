import { eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { openLaboratory } from "#app/features/laboratories/open-laboratory.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { deadLinkSentence, spendEmailToken } from "./spend-email-token.server.ts";

/**
 * The address is theirs: makes the account and opens the laboratory that was asked for, both or neither. Short name and
 * letters come again, since somebody may have taken them meanwhile.
 */
export async function confirmEmail(app: AppContext, { token, slug, prefix }: { token: string } & Pick<NewLaboratory, "slug" | "prefix">): Promise<{ userId: UserId; labSlug: string }> {
  await consume(app, { door: "link", key: app.clientAddress });
  try {
    return await inTransaction(app.db, async (tx) => {
      const inTx = { ...app, db: tx };
      const { email, payload } = await spendEmailToken(inTx, { token, purpose: "confirmEmail" });
      if (!payload.signUp) throw new AppError("not_found", deadLinkSentence);
      const [existing] = await tx.select({ id: users.id }).from(users).where(eq(users.email, email));
      if (existing) throw haveOne();
      const userId = newId<"user">();
      await tx.insert(users).values({ id: userId, email, name: payload.name ?? email, passwordHash: payload.signUp.passwordHash, passwordChangedAt: app.now, emailConfirmedAt: app.now, createdAt: app.now });
      const opened = await openLaboratory(inTx, { ownerId: userId, laboratory: { ...payload.signUp.laboratory, slug, prefix } });
      return { userId, labSlug: opened.slug };
    });
  } catch (error) {
    if (constraintKind(error) === "duplicate") throw haveOne(error);
    throw error;
  }
}

function haveOne(cause?: unknown): AppError {
  return new AppError("conflict", "This address has an account by now. Sign in with it; a further laboratory is opened from there.", { cause });
}
