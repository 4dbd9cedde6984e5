import { eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { findEmailToken } from "./find-email-token.server.ts";
import { normalPassword } from "./normal-password.ts";
import { requireGoodPassword } from "./require-good-password.server.ts";
import { setPassword } from "./set-password.server.ts";
import { deadLinkSentence, spendEmailToken } from "./spend-email-token.server.ts";

/** Sets the password by a link from a letter: the link works once, and every session of the person ends. */
export async function resetPassword(app: AppContext, { token, password }: { token: string; password: string }): Promise<UserId> {
  await consume(app, { door: "link", key: app.clientAddress });
  const found = await findEmailToken(app, { token, purposes: ["resetPassword"] });
  const [user] = found?.userId ? await app.db.select({ id: users.id, name: users.name, email: users.email }).from(users).where(eq(users.id, found.userId)) : [];
  if (!user) throw new AppError("not_found", deadLinkSentence);
  requireGoodPassword({ password, name: user.name, email: user.email });
  const passwordHash = await app.services.passwords.hash(normalPassword(password));
  await inTransaction(app.db, async (tx) => {
    await spendEmailToken({ ...app, db: tx }, { token, purpose: "resetPassword" });
    await setPassword({ ...app, db: tx }, { user, passwordHash });
  });
  return user.id;
}
