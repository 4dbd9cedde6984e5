import { drizzle } from "drizzle-orm/mysql2";
import type { Connection } from "mysql2/promise";
import { beforeAll, expect, test } from "vitest";
import type { Db } from "#app/db/client.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { items, stoneSearchTokens, stones, takeIns } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { listStones, type StoneQuery } from "#app/features/stones/list-stones.server.ts";
import { indexTokens } from "#app/features/stones/search-tokens.ts";
import { aClient, aLab, anInstrument } from "../../setup/factories.ts";
import { openTestDb } from "../../setup/test-db.ts";

const bookSize = 20_000;
const pageSize = 50;
let ctx: LabContext;

beforeAll(async () => {
  ctx = await aLab();
  await aLab();
  const balanceId = await anInstrument(ctx);
  const clientId = await aClient(ctx);
  const [takeInId, itemId] = [newId<"takeIn">(), newId<"item">()];
  const { db, laboratoryId } = ctx;
  await db.insert(takeIns).values({ laboratoryId, id: takeInId, number: "X-T-26-0001", clientId, handedOverBy: "A", capacity: "owner", receivedAt: ctx.now, receivedBy: ctx.actorId, dueOn: "2026-12-08", services: ["identification"], returnMethod: "collect", clientStatements: "", feeAgreedAt: ctx.now, requestId: newId() });
  await db.insert(items).values({ laboratoryId, id: itemId, takeInId, position: 1, number: "X-26-0001", description: "Red oval", stoneCount: 1, mount: "loose", massValue: 1, massText: "1", massUnit: "ct", balanceId, condition: "none seen" });
  const states = ["received", "examining", "concluded", "issued"] as const;
  for (let at = 0; at < bookSize; at += 1000) {
    const rows = Array.from({ length: 1000 }, (_, index) => {
      const number = at + index;
      return {
        laboratoryId, id: newId<"stone">(), takeInId, itemId, clientId, code: `X-26-${String(number).padStart(5, "0")}-1`, sequence: number,
        description: number % 1000 === 7 ? "Violet pear" : "Red oval", examinationState: states[number % 4]!, examinationStateAt: ctx.now, goodsState: number % 4 === 3 ? ("released" as const) : ("safe" as const),
        place: "Safe 1", isMounted: false, isValuationOrdered: false, receivedAt: new Date(ctx.now.getTime() - number * 60_000), dueOn: `2026-${String((number % 12) + 1).padStart(2, "0")}-15`,
      };
    });
    await db.insert(stones).values(rows);
    await db.insert(stoneSearchTokens).values(rows.flatMap((row) => indexTokens([row.description]).map((token) => ({ laboratoryId, token, receivedAt: row.receivedAt, stoneId: row.id }))));
  }
}, 60_000);

/** Runs one call on one connection and gives the rows it touched and the statements it sent. */
async function costOf(work: (db: Db) => Promise<unknown>) {
  const { pool } = await openTestDb();
  const connection = await pool.getConnection();
  const statements: string[] = [];
  try {
    const db = drizzle({ client: connection as unknown as Connection, mode: "default", logger: { logQuery: (text) => void statements.push(text) } }) as unknown as Db;
    const handlerReads = async () => {
      const [rows] = await connection.query("show session status where variable_name like 'Handler_read%'");
      return (rows as Array<{ Value: string }>).reduce((sum, row) => sum + Number(row.Value), 0);
    };
    // Asking for the counters moves them: how far is measured first.
    const [before, again] = [await handlerReads(), await handlerReads()];
    const result = await work(db);
    return { result, touched: (await handlerReads()) - again - (again - before), statements };
  } finally {
    connection.release();
  }
}

const first: StoneQuery = { pageSize };
const queries: Array<[string, StoneQuery, number]> = [
  ["the whole book", {}, pageSize + 10],
  ["by due date", { sort: "due" }, pageSize + 10],
  ["one state", { state: "examining" }, pageSize + 10],
  ["one state by due date", { state: "examining", sort: "due" }, pageSize + 10],
  ["released goods", { state: "released" }, pageSize + 10],
  // Three ranges, each read as far as a page needs, and their merged result read once.
  ["goods in the house", { state: "house" }, 6 * pageSize],
  // A row of the token table and the stone that it names.
  ["a common word", { search: "red" }, 2 * pageSize + 10],
  ["a rare word", { search: "violet" }, 2 * pageSize + 10],
];

test.each(queries)("a page of %s costs a page, first, in the middle and last", async (_, query, most) => {
  const page = (fields: StoneQuery) => costOf((db) => listStones({ ...ctx, db }, { ...first, ...query, ...fields }));
  const opening = await page({});
  expect(opening.touched).toBeLessThanOrEqual(most);
  const start = opening.result as Awaited<ReturnType<typeof listStones>>;
  expect(start.stones.length).toBeGreaterThan(10);
  const last = start.stones.at(-1)!;
  const middleKey = query.sort === "due" ? "2026-06-15" : String(ctx.now.getTime() - (bookSize / 2) * 60_000);
  const middle = await page({ after: { key: middleKey, id: last.id } });
  expect(middle.touched).toBeLessThanOrEqual(most);
  const end = await page({ before: { key: query.sort === "due" ? "9999-12-31" : "0", id: last.id } });
  expect(end.touched).toBeLessThanOrEqual(most);
});

test("what is overdue costs a page per unfinished state, whatever the book holds", async () => {
  const { touched } = await costOf((db) => listStones({ ...ctx, db }, { ...first, due: "overdue" }));
  expect(touched).toBeLessThanOrEqual(8 * pageSize);
});

test("a page is two statements, without a count and without an offset", async () => {
  for (const query of [...queries.map(([, fields]) => fields), { due: "overdue" } as StoneQuery]) {
    const { statements } = await costOf((db) => listStones({ ...ctx, db }, { ...first, ...query }));
    expect(statements).toHaveLength(2);
    for (const text of statements) expect(text).not.toMatch(/count\s*\(|\boffset\b/i);
  }
});
