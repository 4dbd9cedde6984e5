import { sessions } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { sessionAbsoluteMs } from "./session-lifetime.ts";
import { hashToken, newToken } from "./token.server.ts";

/** @returns the token for the cookie: its only copy */
export async function startSession(app: AppContext, { userId, userAgent }: { userId: UserId; userAgent: string }): Promise<string> {
  const token = newToken();
  await app.db.insert(sessions).values({
    tokenHash: hashToken(token),
    userId,
    data: {},
    userAgent: userAgent.slice(0, 255),
    createdAt: app.now,
    lastSeenAt: app.now,
    expiresAt: new Date(app.now.getTime() + sessionAbsoluteMs),
  });
  return token;
}
