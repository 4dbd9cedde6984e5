import { and, eq, isNull } from "drizzle-orm";
import { emailTokens, users } from "#app/db/schema/index.ts";
import { formatInstant } from "#app/domain/calendar-date.ts";
import type { UserId } from "#app/domain/ids.ts";
import { passwordChangedEmail } from "#app/emails/password-changed-email.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { endAllSessions } from "./end-all-sessions.server.ts";

/** The new password's effect, in the caller's transaction: every session ends, open reset links die, the person is told. */
export async function setPassword(app: AppContext, { user, passwordHash }: { user: { id: UserId; name: string; email: string }; passwordHash: string }): Promise<void> {
  await app.db.update(users).set({ passwordHash, passwordChangedAt: app.now }).where(eq(users.id, user.id));
  await app.db.update(emailTokens).set({ usedAt: app.now }).where(and(eq(emailTokens.userId, user.id), eq(emailTokens.purpose, "resetPassword"), isNull(emailTokens.usedAt)));
  await endAllSessions(app, { userId: user.id });
  await queueMail(app, {
    laboratoryId: null,
    to: { address: user.email, name: user.name },
    kind: "passwordChanged",
    dedupeKey: `passwordChanged:${user.id}:${app.now.getTime()}`,
    message: passwordChangedEmail({ recipientName: user.name, changedAt: `${formatInstant(app.now, "UTC")} UTC`, url: `${app.services.publicOrigin}/forgot-password` }),
  });
}
