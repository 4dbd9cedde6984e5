import { drizzle, type MySql2Database } from "drizzle-orm/mysql2";
import mysql, { type Pool } from "mysql2/promise";

export type Db = MySql2Database<Record<string, never>>;
export type Tx = Parameters<Parameters<Db["transaction"]>[0]>[0];
export type OpenDb = { db: Db; pool: Pool; close: () => Promise<void> };

/** One pool a process. Times are UTC on both sides; big integers are not rounded. */
export function openDb(url: string, { connectionLimit = 10 }: { connectionLimit?: number } = {}): OpenDb {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    timezone: "Z",
    supportBigNumbers: true,
    charset: "utf8mb4",
    enableKeepAlive: true,
  });
  // Strict on every connection, whatever server DATABASE_URL names; statements cannot run away.
  pool.pool.on("connection", (connection) => {
    connection.query(
      "set session sql_mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION', time_zone = '+00:00', innodb_snapshot_isolation = ON, max_statement_time = 20",
      (error: Error | null) => {
        if (error) connection.destroy();
      },
    );
  });
  const db = drizzle({ client: pool }) as unknown as Db;
  return { db, pool, close: () => pool.end() };
}
