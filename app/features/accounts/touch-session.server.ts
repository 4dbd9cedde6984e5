import { and, eq } from "drizzle-orm";
import { sessions } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { sessionTouchMs } from "./session-lifetime.ts";
import { hashToken } from "./token.server.ts";

/** Notes that a session is in use, at most every few minutes and once among parallel requests. */
export async function touchSession(app: AppContext, { token, lastSeenAt }: { token: string; lastSeenAt: Date }): Promise<void> {
  if (app.now.getTime() - lastSeenAt.getTime() <= sessionTouchMs) return;
  await app.db
    .update(sessions)
    .set({ lastSeenAt: app.now })
    .where(and(eq(sessions.tokenHash, hashToken(token)), eq(sessions.lastSeenAt, lastSeenAt)));
}
