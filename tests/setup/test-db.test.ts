import { sql } from "drizzle-orm";
import { expect, test } from "vitest";
import { getTestDb } from "./test-db.ts";

test("each worker has a migrated database of its own", async () => {
  const db = await getTestDb();
  const [rows] = (await db.execute(sql`select database() as name, count(*) as tables from information_schema.tables where table_schema = database()`)) as unknown as [
    { name: string; tables: number }[],
  ];
  expect(rows[0]?.name).toBe(`isogyre_test_${process.env.VITEST_POOL_ID}`);
  expect(rows[0]?.tables).toBeGreaterThan(20);
});

test("every connection is strict and speaks UTC", async () => {
  const db = await getTestDb();
  const [rows] = (await db.execute(sql`select @@sql_mode as mode, @@time_zone as zone`)) as unknown as [{ mode: string; zone: string }[]];
  expect(rows[0]?.mode).toContain("STRICT_ALL_TABLES");
  expect(rows[0]?.zone).toBe("+00:00");
});
