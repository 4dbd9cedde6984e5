import { randomUUID } from "node:crypto";
import { inject, expect, test } from "vitest";
import { openDb } from "#app/db/client.server.ts";
import { rateLimits } from "#app/db/schema/index.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { doors } from "#app/features/rate-limits/doors.ts";
import { giveBack } from "#app/features/rate-limits/give-back.server.ts";
import { testNow } from "../../setup/factories.ts";
import { getTestDb } from "../../setup/test-db.ts";

const opens = (passage: Promise<void>) => passage.then(() => true, (error) => (expect(error).toMatchObject({ code: "rate_limited" }), false));

test("a door opens exactly as often as it says, for two processes at once", async () => {
  await getTestDb();
  const url = new URL(inject("serverUrl"));
  url.pathname = `isogyre_test_${process.env.VITEST_POOL_ID ?? "1"}`;
  const pools = [openDb(url.href), openDb(url.href)];
  const key = randomUUID();
  const answers = await Promise.all(Array.from({ length: 60 }, (_, at) => opens(consume({ db: pools[at % 2]!.db, now: testNow }, { door: "signIn", key }))));
  await Promise.all(pools.map((pool) => pool.close()));
  expect(answers.filter(Boolean)).toHaveLength(10);
});

test("a closed door says for how long, and opens after that", async () => {
  const db = await getTestDb();
  const passage = { door: "reset", key: randomUUID() } as const;
  for (let at = 0; at < 3; at++) await consume({ db, now: new Date(testNow.getTime() + at * 60_000) }, passage);
  const now = new Date(testNow.getTime() + 10 * 60_000);
  await expect(consume({ db, now }, passage)).rejects.toMatchObject({ status: 429, retryAfterS: 50 * 60, userMessage: expect.stringContaining("Try again in 50 minutes.") });
  await consume({ db, now: new Date(testNow.getTime() + 60 * 60_000) }, passage);
});

test("keys and doors are counted apart, and what is given back is not counted", async () => {
  const db = await getTestDb();
  const [key, other] = [randomUUID(), randomUUID()];
  const app = { db, now: testNow };
  for (let at = 0; at < 12; at++) {
    await consume(app, { door: "signIn", key });
    await giveBack(app, { door: "signIn", key });
  }
  for (let at = 0; at < 3; at++) await consume(app, { door: "reset", key });
  await expect(consume(app, { door: "reset", key })).rejects.toMatchObject({ code: "rate_limited" });
  await consume(app, { door: "reset", key: other });
  await consume(app, { door: "signIn", key });
});

test("the limits are those that the security bar asks for", () => {
  expect(doors.signIn).toMatchObject({ most: 10, windowMs: 900_000 });
  expect(doors.signInAddress).toMatchObject({ most: 100, windowMs: 900_000 });
  expect(doors.reset).toMatchObject({ most: 3, windowMs: 3_600_000 });
  expect(doors.verify).toMatchObject({ most: 60, windowMs: 60_000 });
});

test("the counters keep no address of a person or a network in clear", async () => {
  const db = await getTestDb();
  await consume({ db, now: testNow }, { door: "signIn", key: "somebody.findable@example.test" });
  const rows = await db.select({ key: rateLimits.key }).from(rateLimits);
  expect(rows.filter(({ key }) => key.includes("findable"))).toEqual([]);
});
