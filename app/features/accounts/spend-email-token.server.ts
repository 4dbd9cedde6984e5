import { and, eq, gt, isNull } from "drizzle-orm";
import { emailTokens, type EmailTokenPurpose } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { findEmailToken, type FoundEmailToken } from "./find-email-token.server.ts";
import { hashToken } from "./token.server.ts";

/** One sentence for a link that was used, ran out, was withdrawn or never was. */
export const deadLinkSentence = "This link does not work any more: it was used, it ran out, or a newer one replaced it.";

/** Uses a link up, once among any number of tries. Belongs in the transaction of its effect. @throws AppError not_found */
export async function spendEmailToken(app: Pick<AppContext, "db" | "now">, { token, purpose }: { token: string; purpose: EmailTokenPurpose }): Promise<FoundEmailToken> {
  const found = await findEmailToken(app, { token, purposes: [purpose] });
  const [result] = await app.db
    .update(emailTokens)
    .set({ usedAt: app.now })
    .where(and(eq(emailTokens.tokenHash, hashToken(token)), eq(emailTokens.purpose, purpose), isNull(emailTokens.usedAt), gt(emailTokens.expiresAt, app.now)));
  if (!found || result.affectedRows !== 1) throw new AppError("not_found", deadLinkSentence);
  return found;
}
