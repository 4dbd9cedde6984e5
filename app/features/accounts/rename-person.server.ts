import { eq } from "drizzle-orm";
import { users } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** Changes the name a person goes by. Reports that were issued keep the name that signed them. */
export async function renamePerson(app: AppContext, { userId, name }: { userId: UserId; name: string }): Promise<void> {
  await app.db.update(users).set({ name }).where(eq(users.id, userId));
}
