import { and, eq, gt, sql } from "drizzle-orm";
import { rateLimits } from "#app/db/schema/index.ts";
import type { Passage, RateLimitContext } from "./consume.server.ts";
import { limitKey } from "./limit-key.server.ts";

/** Takes one passage back: a right password is no guess. */
export async function giveBack({ db, now }: RateLimitContext, passage: Passage): Promise<void> {
  await db
    .update(rateLimits)
    .set({ points: sql`${rateLimits.points} - 1` })
    .where(and(eq(rateLimits.key, limitKey(passage)), gt(rateLimits.expire, now.getTime()), gt(rateLimits.points, 0)));
}
