import type { Db, Tx } from "./client.server.ts";
import { isRetryable } from "./errors.server.ts";

/**
 * Runs `work` in one transaction and tries the whole of it again, at most four times, after a deadlock.
 * `work` must do nothing outside the database: mail, payment and PDF calls follow after the commit.
 * Inside another transaction `work` joins that one.
 */
export async function inTransaction<T>(db: Db | Tx, work: (tx: Tx) => Promise<T>): Promise<T> {
  if ("rollback" in db) return work(db as Tx);
  for (let attempt = 1; ; attempt++) {
    try {
      return await (db as Db).transaction(work, { isolationLevel: "read committed" });
    } catch (error) {
      if (attempt >= 5 || !isRetryable(error)) throw error;
      await new Promise((resolve) => setTimeout(resolve, attempt * 15 + attempt * 10 * Math.random()));
    }
  }
}
