import { eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { users } from "#app/db/schema/index.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import { accountExistsEmail } from "#app/emails/account-exists-email.ts";
import { confirmEmailEmail } from "#app/emails/confirm-email-email.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { requireFreeNames } from "#app/features/laboratories/require-free-names.server.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { confirmHours, confirmMs, resetMinutes, resetMs } from "./email-token-lifetime.ts";
import { normalEmail } from "./normal-email.ts";
import { normalPassword } from "./normal-password.ts";
import { requireGoodPassword } from "./require-good-password.server.ts";
import { writeEmailToken } from "./write-email-token.server.ts";

export type SignUp = { name: string; email: string; password: string; requestId: string; laboratory: NewLaboratory };

/**
 * Asks for an account and a laboratory. Nothing exists before the address is confirmed, so nobody can hold another's
 * address or name; and whether the address has an account already is told to its mailbox alone: answer, work and
 * statements are the same in both cases.
 */
export async function signUpLaboratory(app: AppContext, { name, email, password, requestId, laboratory }: SignUp): Promise<void> {
  const address = normalEmail(email);
  requireGoodPassword({ password, name, email: address, laboratoryName: laboratory.name });
  await consume(app, { door: "signUp", key: app.clientAddress });
  await requireFreeNames(app, laboratory);
  await consume(app, { door: "reset", key: address });
  const passwordHash = await app.services.passwords.hash(normalPassword(password));
  await inTransaction(app.db, async (tx) => {
    const inTx = { ...app, db: tx };
    const [existing] = await tx.select({ id: users.id, name: users.name, email: users.email }).from(users).where(eq(users.email, address));
    const token = await writeEmailToken(
      inTx,
      existing ? { purpose: "resetPassword", email: address, userId: existing.id, validMs: resetMs } : { purpose: "confirmEmail", email: address, validMs: confirmMs, payload: { name, requestId, signUp: { passwordHash, laboratory } } },
    );
    await queueMail(inTx, {
      laboratoryId: null,
      to: { address: existing?.email ?? address, name: existing?.name ?? name },
      kind: existing ? "accountExists" : "confirmEmail",
      dedupeKey: `signUp:${requestId}`,
      message: existing
        ? accountExistsEmail({ recipientName: existing.name, resetUrl: `${app.services.publicOrigin}/reset-password/${token}`, validMinutes: resetMinutes })
        : confirmEmailEmail({ recipientName: name, url: `${app.services.publicOrigin}/confirm-email/${token}`, validHours: confirmHours }),
    });
  });
}
