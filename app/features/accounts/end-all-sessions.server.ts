import { and, eq, ne } from "drizzle-orm";
import { sessions } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { hashToken } from "./token.server.ts";

/** Signs a person out everywhere; `exceptToken` keeps the session that asks. */
export async function endAllSessions(app: AppContext, { userId, exceptToken }: { userId: UserId; exceptToken?: string }): Promise<void> {
  const kept = exceptToken ? ne(sessions.tokenHash, hashToken(exceptToken)) : undefined;
  await app.db.delete(sessions).where(and(eq(sessions.userId, userId), kept));
}
