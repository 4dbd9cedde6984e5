import { eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { giveBack } from "#app/features/rate-limits/give-back.server.ts";
import { normalPassword } from "./normal-password.ts";
import { requireGoodPassword } from "./require-good-password.server.ts";
import { setPassword } from "./set-password.server.ts";
import { startSession } from "./start-session.server.ts";

type PasswordChange = { userId: UserId; currentPassword: string; password: string; userAgent: string };

/** Changes the password of somebody who knows the current one. Every session ends. @returns the token of a new one for the place that asks */
export async function changePassword(app: AppContext, { userId, currentPassword, password, userAgent }: PasswordChange): Promise<string> {
  const passage = { door: "password", key: userId } as const;
  await consume(app, passage);
  const [user] = await app.db
    .select({ id: users.id, name: users.name, email: users.email, passwordHash: users.passwordHash, isDemonstration: users.isDemonstration })
    .from(users)
    .where(eq(users.id, userId));
  if (!user || !(await app.services.passwords.matches(normalPassword(currentPassword), user.passwordHash))) {
    const message = "This is not the current password.";
    throw new AppError("invalid_input", message, { fieldErrors: { currentPassword: [message] } });
  }
  await giveBack(app, passage);
  if (user.isDemonstration) throw new AppError("conflict", "The demonstration people keep their password, so that everybody can sign in as them.");
  requireGoodPassword({ password, name: user.name, email: user.email });
  const passwordHash = await app.services.passwords.hash(normalPassword(password));
  return inTransaction(app.db, async (tx) => {
    const inTx = { ...app, db: tx };
    await setPassword(inTx, { user, passwordHash });
    return startSession(inTx, { userId, userAgent });
  });
}
