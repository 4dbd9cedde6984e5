import { and, desc, eq, gt } from "drizzle-orm";
import { sessions } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { describeUserAgent } from "./describe-user-agent.ts";
import { sessionIdleMs } from "./session-lifetime.ts";
import { hashToken } from "./token.server.ts";

const most = 100;

/** Where a person is signed in, the latest used first. `id` names a session to its owner and opens nothing. */
export async function listSessions(app: AppContext, { userId, currentToken }: { userId: UserId; currentToken: string }) {
  const rows = await app.db
    .select({ tokenHash: sessions.tokenHash, userAgent: sessions.userAgent, createdAt: sessions.createdAt, lastSeenAt: sessions.lastSeenAt })
    .from(sessions)
    .where(and(eq(sessions.userId, userId), gt(sessions.expiresAt, app.now), gt(sessions.lastSeenAt, new Date(app.now.getTime() - sessionIdleMs))))
    .orderBy(desc(sessions.lastSeenAt))
    .limit(most);
  const current = hashToken(currentToken);
  return rows.map(({ tokenHash, userAgent, ...row }) => ({ ...row, id: tokenHash.toString("hex"), place: describeUserAgent(userAgent), isCurrent: tokenHash.equals(current) }));
}
