import mysql from "mysql2/promise";
import { inject } from "vitest";
import { openDb, type Db, type OpenDb } from "#app/db/client.server.ts";
import { runMigrations } from "../../scripts/migrate.mjs";

let opening: Promise<OpenDb> | undefined;
let address: Promise<string> | undefined;

/** The database of this worker, migrated. Tests share it: each makes a laboratory of its own and never counts rows globally. */
export async function getTestDb(): Promise<Db> {
  return (await openTestDb()).db;
}

/** As `getTestDb`, with the pool, for what needs a connection of its own. */
export function openTestDb(): Promise<OpenDb> {
  opening ??= testDbUrl().then(openDb);
  return opening;
}

/** Where it is, for what stands for another process. */
export function testDbUrl(): Promise<string> {
  address ??= createTestDb();
  return address;
}

async function createTestDb(): Promise<string> {
  const url = new URL(inject("serverUrl"));
  const name = `isogyre_test_${process.env.VITEST_POOL_ID ?? "1"}`;
  const connection = await mysql.createConnection({ uri: url.href });
  await connection.query(`create database if not exists ${name} character set utf8mb4 collate utf8mb4_uca1400_ai_ci`);
  await connection.end();
  url.pathname = name;
  await runMigrations(url.href);
  return url.href;
}
