import { eq } from "drizzle-orm";
import { clientUsers } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** Whether a person has pages of their own as somebody's client. */
export async function isClientSomewhere({ db }: Pick<AppContext, "db">, userId: UserId): Promise<boolean> {
  const [row] = await db.select({ clientId: clientUsers.clientId }).from(clientUsers).where(eq(clientUsers.userId, userId)).limit(1);
  return row !== undefined;
}
