import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { stones } from "#app/db/schema/index.ts";
import { eachStone } from "#app/features/stones/each-stone.server.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { listStones, type StoneQuery } from "#app/features/stones/list-stones.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { takeInItems } from "#app/features/take-ins/take-in-items.server.ts";
import { aClient, aLab, aMember, anInstrument, later } from "../../setup/factories.ts";
import { aTakenInItem, itemInput, takeInInput } from "../../setup/take-in-factory.ts";

async function aBook(): Promise<{ ctx: LabContext; codes: string[] }> {
  const ctx = await aLab();
  const balance = await anInstrument(ctx);
  const codes: string[] = [];
  for (const [at, description] of ["Red oval", "Blue cushion", "Green octagon", "Blue pear", "Colourless round"].entries()) {
    const input = await takeInInput(ctx, { client: { id: await aClient(ctx, { name: at < 3 ? "Ardenne Estate" : "Holm Lane" }) }, items: [itemInput(balance, { description, stoneCount: at === 0 ? 2 : 1 })], dueOn: `2026-12-${10 - at < 10 ? "0" : ""}${10 - at}` });
    const { takeInId } = await takeInItems(later(ctx, at * 3_600_000), input);
    codes.push(...(await ctx.db.select({ code: stones.code }).from(stones).where(eq(stones.takeInId, takeInId))).map((row) => row.code));
  }
  return { ctx, codes };
}
const walk = async (ctx: LabContext, query: StoneQuery) => {
  const seen: string[] = [];
  let page = await listStones(ctx, { ...query, pageSize: 2 });
  for (;;) {
    seen.push(...page.stones.map((stone) => stone.code));
    if (!page.later) return { seen, last: page };
    page = await listStones(ctx, { ...query, pageSize: 2, after: page.later });
  }
};

test("the logbook shows the latest first, each stone once, the same way back", async () => {
  const { ctx, codes } = await aBook();
  const { seen, last } = await walk(ctx, {});
  expect([...seen].sort()).toEqual([...codes].sort());
  expect(seen.slice(0, 4)).toEqual([...codes].reverse().slice(0, 4));
  const back = await listStones(ctx, { pageSize: 2, before: last.earlier! });
  expect(back.stones.map((stone) => stone.code)).toEqual(seen.slice(2, 4));
  expect(back.later).not.toBeNull();
});

test.each([{}, { sort: "due" }, { state: "house" }, { state: "received" }, { state: "received", sort: "due" }, { due: "week" }, { search: "blue" }, { isTurned: true }, { sort: "due", isTurned: true }, { state: "house", isTurned: true }] as StoneQuery[])(
  "walking %o page by page gives what one page gives",
  async (query) => {
    const { ctx } = await aBook();
    const { seen } = await walk(ctx, query);
    expect(seen).toEqual((await listStones(ctx, query)).stones.map((stone) => stone.code));
    expect(seen.length).toBeGreaterThan(0);
  },
);

test("a row says whose it is, who has it, where, when it is due and whether that is past", async () => {
  const { ctx } = await aBook();
  const [stone] = (await listStones(later(ctx, 8 * 86_400_000), { pageSize: 1 })).stones;
  expect(stone).toMatchObject({ description: "Colourless round", client: "Holm Lane", place: "Safe 1", holder: null, weightText: "2.143", dueOn: "2026-12-06", isOverdue: true });
});

test("filters narrow by state, client, holder and due date", async () => {
  const { ctx, codes } = await aBook();
  const all = (await listStones(ctx)).stones;
  await ctx.db.update(stones).set({ examinationState: "examining", goodsState: "bench", holderId: ctx.actorId }).where(eq(stones.code, codes[0]!));
  await ctx.db.update(stones).set({ examinationState: "issued", goodsState: "released" }).where(eq(stones.code, codes[5]!));
  const list = async (query: StoneQuery) => (await listStones(ctx, query)).stones.map((stone) => stone.code);
  expect(await list({ state: "examining" })).toEqual([codes[0]]);
  expect(await list({ state: "released" })).toEqual([codes[5]]);
  expect(await list({ state: "house" })).toEqual([...codes].reverse().filter((code) => code !== codes[5]).toSorted((a, b) => (a < b ? 1 : -1)));
  expect(await list({ holderId: ctx.actorId })).toEqual([codes[0]]);
  const holm = idFromShortRef<"client">(all.find((stone) => stone.code === codes[4])!.clientRef)!;
  expect(await list({ clientId: holm })).toEqual([codes[4]]);
  expect(await list({ clientId: holm, state: "received" })).toEqual([codes[4]]);
  expect(await list({ clientId: holm, state: "issued" })).toEqual([]);
  expect(await list({ due: "overdue" })).toEqual([]);
  const week = await listStones(ctx, { due: "week" });
  expect(week.stones.map((stone) => stone.dueOn)).toEqual([]);
  expect((await listStones(later(ctx, 20 * 86_400_000), { due: "overdue" })).stones).toHaveLength(5);
});

test("the search finds by code, words, client and take-in, and by several at once", async () => {
  const { ctx, codes } = await aBook();
  const list = async (search: string) => (await listStones(ctx, { search })).stones.map((stone) => stone.code);
  expect(await list(codes[3]!)).toEqual([codes[3]]);
  expect(await list("blue")).toEqual([codes[4], codes[2]]);
  expect(await list("blue holm")).toEqual([codes[4]]);
  expect(await list("T-26-0002")).toEqual([codes[2]]);
  expect(await list("amethystine")).toEqual([]);
  expect(await list("%")).toEqual([]);
  expect(await list("'; drop table stones; --")).toEqual([]);
});

test("another laboratory's logbook is another book", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  await aTakenInItem(ours);
  expect((await listStones(theirs)).stones).toEqual([]);
  expect((await listStones(theirs, { search: "red" })).stones).toEqual([]);
  await expect(listStones(await aMember(ours, []))).rejects.toMatchObject({ code: "forbidden" });
});

test("an export walks the whole book", async () => {
  const { ctx, codes } = await aBook();
  const seen = [];
  for await (const stone of eachStone(ctx, {})) seen.push(stone.code);
  expect(seen).toHaveLength(codes.length);
});
