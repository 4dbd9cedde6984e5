import { eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** Who accepts: somebody signed in, or somebody who gets an account by it. */
export type Acceptance = { token: string } & ({ signedInAs: UserId } | { name: string; passwordHash: string });

/**
 * The account that an invitation to `email` is for. An existing one must be signed in: holding the link is not knowing
 * its password. A new one is confirmed, since its link came by that mailbox. Belongs in the transaction of the acceptance.
 */
export async function invitedPerson(app: AppContext, { email, acceptance }: { email: string; acceptance: Acceptance }): Promise<UserId> {
  const [existing] = await app.db.select({ id: users.id }).from(users).where(eq(users.email, email));
  if ("signedInAs" in acceptance) {
    if (existing?.id !== acceptance.signedInAs) throw new AppError("conflict", `This invitation is for ${email}. Sign out, and open the link again.`);
    return existing.id;
  }
  if (existing) throw new AppError("conflict", `${email} has an account already. Sign in with it, and open the link again.`);
  const userId = newId<"user">();
  await app.db.insert(users).values({ id: userId, email, name: acceptance.name, passwordHash: acceptance.passwordHash, passwordChangedAt: app.now, emailConfirmedAt: app.now, createdAt: app.now });
  return userId;
}
