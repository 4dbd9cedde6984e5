import { sql } from "drizzle-orm";
import { isRetryable } from "#app/db/errors.server.ts";
import { rateLimits } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { doors, type Door } from "./doors.ts";
import { limitKey } from "./limit-key.server.ts";

export type RateLimitContext = Pick<AppContext, "db" | "now">;
export type Passage = Readonly<{ door: Door; key: string }>;

/**
 * Counts one passage through a door. One statement, so the limit holds exactly for any number of processes. Call it
 * outside a transaction: a rollback would take the count back.
 * @throws AppError rate_limited, with the seconds to wait, beyond the door's limit
 */
export async function consume({ db, now }: RateLimitContext, { door, key }: Passage): Promise<void> {
  const { most, windowMs, sentence } = doors[door];
  const nowMs = now.getTime();
  const count = () =>
    db.execute(sql`
      insert into ${rateLimits} (\`key\`, points, expire) values (${limitKey({ door, key })}, 1, ${nowMs + windowMs})
      on duplicate key update
        points = if(expire <= ${nowMs}, 1, points + 1),
        expire = if(expire <= ${nowMs}, values(expire), expire)
      returning points, expire`) as unknown as Promise<[Array<{ points: number; expire: number }>]>;
  const [rows] = await withRetry(count);
  const { points, expire } = rows[0]!;
  if (Number(points) <= most) return;
  const retryAfterS = Math.max(1, Math.ceil((Number(expire) - nowMs) / 1000));
  throw new AppError("rate_limited", `${sentence} Try again in ${inWords(retryAfterS)}.`, { retryAfterS });
}

async function withRetry<T>(work: () => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await work();
    } catch (error) {
      if (attempt >= 5 || !isRetryable(error)) throw error;
    }
  }
}

function inWords(seconds: number): string {
  if (seconds < 90) return `${seconds} ${seconds === 1 ? "second" : "seconds"}`;
  return `${Math.ceil(seconds / 60)} minutes`;
}
