import { and, eq } from "drizzle-orm";
import { sessions } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** Ends one of a person's own sessions, named as `listSessions` names it. */
export async function endOneSession(app: AppContext, { userId, sessionId }: { userId: UserId; sessionId: string }): Promise<void> {
  const isName = /^[0-9a-f]{64}$/.test(sessionId);
  const [result] = isName ? await app.db.delete(sessions).where(and(eq(sessions.userId, userId), eq(sessions.tokenHash, Buffer.from(sessionId, "hex")))) : [];
  if (result?.affectedRows !== 1) throw new AppError("not_found", "That place is not signed in any more.");
}
