import { eq } from "drizzle-orm";
import { sessions } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { hashToken } from "./token.server.ts";

export async function endSession(app: AppContext, token: string): Promise<void> {
  await app.db.delete(sessions).where(eq(sessions.tokenHash, hashToken(token)));
}
