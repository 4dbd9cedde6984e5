import { lt } from "drizzle-orm";
import { emailTokens, rateLimits, sessions } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";

const tokensKeptMs = 90 * 24 * 60 * 60 * 1000;
const atOnce = 500;

/** Removes sessions and counters that ran out, and links long past their end. Small bites, so that nobody waits for a lock. */
export async function purgeExpired({ db, now }: Pick<AppContext, "db" | "now">): Promise<void> {
  await db.delete(sessions).where(lt(sessions.expiresAt, now)).limit(atOnce);
  await db.delete(rateLimits).where(lt(rateLimits.expire, now.getTime())).limit(atOnce);
  await db.delete(emailTokens).where(lt(emailTokens.expiresAt, new Date(now.getTime() - tokensKeptMs))).limit(atOnce);
}
