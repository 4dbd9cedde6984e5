import { eq } from "drizzle-orm";
import { users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { giveBack } from "#app/features/rate-limits/give-back.server.ts";
import { normalEmail } from "./normal-email.ts";
import { normalPassword } from "./normal-password.ts";

type Claim = { email: string; password: string; /** The demonstration people's password is public. */ mayBeDemonstration: boolean };

/**
 * Whose e-mail address and password these are. An unknown address, an account without password and a wrong password get
 * the same answer after the same work. Counted before the hash is computed; a right password is not counted.
 * @throws AppError rate_limited or invalid_input
 */
export async function verifyPassword(app: AppContext, { email, password, mayBeDemonstration }: Claim): Promise<UserId> {
  const address = normalEmail(email);
  const passages = [
    { door: "signInAddress", key: app.clientAddress },
    { door: "signIn", key: address },
  ] as const;
  for (const passage of passages) await consume(app, passage);
  const [user] = await app.db.select({ id: users.id, passwordHash: users.passwordHash, isDemonstration: users.isDemonstration }).from(users).where(eq(users.email, address));
  const isRight = await app.services.passwords.matches(normalPassword(password), user?.passwordHash ?? null);
  if (!user || !isRight || (user.isDemonstration && !mayBeDemonstration)) {
    throw new AppError("invalid_input", "The e-mail address and the password do not belong together. Check both; the password counts capitals and spaces.");
  }
  for (const passage of passages) await giveBack(app, passage);
  return user.id;
}
