import { eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { users } from "#app/db/schema/index.ts";
import { resetPasswordEmail } from "#app/emails/reset-password-email.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { resetMinutes, resetMs } from "./email-token-lifetime.ts";
import { normalEmail } from "./normal-email.ts";
import { writeEmailToken } from "./write-email-token.server.ts";

/** Sends a link to choose a new password, if there is such an account; the caller must not tell which, nor by its time. */
export async function requestPasswordReset(app: AppContext, { email, requestId }: { email: string; requestId: string }): Promise<void> {
  const address = normalEmail(email);
  await consume(app, { door: "resetAddress", key: app.clientAddress });
  await consume(app, { door: "reset", key: address });
  const [user] = await app.db.select({ id: users.id, name: users.name, email: users.email }).from(users).where(eq(users.email, address));
  if (!user) return;
  await inTransaction(app.db, async (tx) => {
    const token = await writeEmailToken({ ...app, db: tx }, { purpose: "resetPassword", email: user.email, userId: user.id, validMs: resetMs });
    await queueMail({ ...app, db: tx }, {
      laboratoryId: null,
      to: { address: user.email, name: user.name },
      kind: "resetPassword",
      dedupeKey: `resetPassword:${requestId}`,
      message: resetPasswordEmail({ recipientName: user.name, url: `${app.services.publicOrigin}/reset-password/${token}`, validMinutes: resetMinutes }),
    });
  });
}
