import { and, eq, gt } from "drizzle-orm";
import { sessions, users } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { sessionIdleMs } from "./session-lifetime.ts";
import { hashToken } from "./token.server.ts";
import { touchSession } from "./touch-session.server.ts";

export type SignedIn = Readonly<{ userId: UserId; name: string; email: string; isEmailConfirmed: boolean; sessionToken: string }>;

/** Whose session this cookie's token is; undefined when there is none, it ran out, or it was revoked. */
export async function findSignedIn(app: AppContext, token: string): Promise<SignedIn | undefined> {
  const [row] = await app.db
    .select({ userId: users.id, name: users.name, email: users.email, emailConfirmedAt: users.emailConfirmedAt, lastSeenAt: sessions.lastSeenAt })
    .from(sessions)
    .innerJoin(users, eq(users.id, sessions.userId))
    .where(
      and(
        eq(sessions.tokenHash, hashToken(token)),
        gt(sessions.expiresAt, app.now),
        gt(sessions.lastSeenAt, new Date(app.now.getTime() - sessionIdleMs)),
      ),
    );
  if (!row) return undefined;
  await touchSession(app, { token, lastSeenAt: row.lastSeenAt });
  return { userId: row.userId, name: row.name, email: row.email, isEmailConfirmed: row.emailConfirmedAt !== null, sessionToken: token };
}
