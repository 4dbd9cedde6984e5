import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents, clients, invoices, stoneEvents, stones } from "#app/db/schema/index.ts";
import type { HandOver, Release } from "#app/features/custody/custody-forms.server.ts";
import { listCustody } from "#app/features/custody/list-custody.server.ts";
import { massDifference } from "#app/features/custody/mass-difference.ts";
import { recordHandOver } from "#app/features/custody/record-hand-over.server.ts";
import { releaseItem } from "#app/features/custody/release-item.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { aLab, aMember, later } from "../../setup/factories.ts";
import { aRequestId, aTakenInItem } from "../../setup/take-in-factory.ts";

const move = (itemNumber: string, fields: Partial<HandOver> = {}): HandOver => ({
  requestId: aRequestId<"custodyEvent">(),
  itemNumber,
  purpose: "toBench",
  toPlace: "Bench 2",
  holder: undefined,
  massText: "2.143",
  massUnit: "ct",
  seal: "",
  remark: "",
  ...fields,
});
const release = (itemNumber: string, fields: Partial<Release> = {}): Release => ({
  requestId: aRequestId<"custodyEvent">(),
  itemNumber,
  collectedBy: "L. Ardenne",
  idSeen: "passport",
  massText: "2.143",
  massUnit: "ct",
  isConditionAgreed: true,
  seal: "",
  remark: "",
  ...fields,
});
const pay = (ctx: LabContext) => ctx.db.update(invoices).set({ state: "paid", paidAt: ctx.now }).where(eq(invoices.laboratoryId, ctx.laboratoryId));

test("an item goes to the bench with all its stones, and the record says who has it", async () => {
  const ctx = await aLab();
  const { itemId, itemNumber } = await aTakenInItem(ctx, { stoneCount: 3, massText: "4.2", massUnit: "ct" });
  const gemmologist = await aMember(ctx, ["gemmologist"]);
  await recordHandOver(later(ctx, 60_000), move(itemNumber, { holder: gemmologist.actorId, massText: "4.2" }));
  const rows = await ctx.db.select().from(stones).where(eq(stones.itemId, itemId));
  expect(rows.map((row) => [row.goodsState, row.place, row.holderId])).toEqual(Array(3).fill(["bench", "Bench 2", gemmologist.actorId]));
  expect(await listCustody(ctx, itemNumber)).toMatchObject([
    { sequence: 1, purpose: "received" },
    { sequence: 2, purpose: "toBench", fromPlace: "Safe 1", toPlace: "Bench 2", holder: gemmologist.person.name, massText: "4.2" },
  ]);
  expect(await ctx.db.select().from(stoneEvents).where(and(eq(stoneEvents.stoneId, rows[0]!.id), eq(stoneEvents.toState, "bench")))).toHaveLength(1);
});

test("a hand-over sent twice is recorded once", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  const once = move(itemNumber);
  await Promise.all([recordHandOver(ctx, once), recordHandOver(ctx, once)]);
  await recordHandOver(ctx, once);
  expect(await listCustody(ctx, itemNumber)).toHaveLength(2);
});

test("a difference in mass stops a hand-over until it is explained, and is kept in the audit", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  await expect(recordHandOver(ctx, move(itemNumber, { massText: "2.120" }))).rejects.toMatchObject({
    code: "conflict",
    fieldErrors: { massText: ["0.023 ct less than the 2.143 ct of the last weighing. Weigh again; if it is so, explain it in the remark."] },
  });
  expect(await listCustody(ctx, itemNumber)).toHaveLength(1);
  await recordHandOver(ctx, move(itemNumber, { massText: "2.120", remark: "Dust and grease cleaned off, dry cloth" }));
  expect(await ctx.db.select().from(auditEvents).where(and(eq(auditEvents.laboratoryId, ctx.laboratoryId), eq(auditEvents.action, "custody.massDiffers")))).toHaveLength(1);
});

test("grams and carats compare, and a coarse display neither cries wolf nor hides one", () => {
  const ct = (massText: string) => ({ massText, massUnit: "ct" as const });
  const g = (massText: string) => ({ massText, massUnit: "g" as const });
  expect(massDifference({ before: ct("2.143"), after: ct("2.153"), standardUncertaintyCt: null }).isAlarming).toBe(false);
  expect(massDifference({ before: ct("2.143"), after: ct("2.154"), standardUncertaintyCt: null }).isAlarming).toBe(true);
  expect(massDifference({ before: ct("2.143"), after: ct("2.163"), standardUncertaintyCt: 0.01 }).isAlarming).toBe(false);
  expect(massDifference({ before: ct("2.143"), after: g("0.4286"), standardUncertaintyCt: null }).isAlarming).toBe(false);
  expect(massDifference({ before: ct("2.143"), after: ct("2"), standardUncertaintyCt: null }).isAlarming).toBe(true);
  expect(massDifference({ before: g("4.18"), after: g("4.19"), standardUncertaintyCt: null }).isAlarming).toBe(false);
  expect(massDifference({ before: g("4.18"), after: g("4.20"), standardUncertaintyCt: null }).isAlarming).toBe(true);
});

test("goods are weighed on their first opening, on leaving and on return", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  await expect(recordHandOver(ctx, move(itemNumber, { massText: "" }))).rejects.toMatchObject({ fieldErrors: { massText: [expect.stringContaining("first time")] } });
  await recordHandOver(ctx, move(itemNumber));
  await recordHandOver(ctx, move(itemNumber, { purpose: "toSafe", toPlace: "Safe 1", massText: "" }));
  await recordHandOver(ctx, move(itemNumber, { massText: "" }));
  await recordHandOver(ctx, move(itemNumber, { purpose: "toSafe", toPlace: "Safe 1", massText: "" }));
  await expect(recordHandOver(ctx, move(itemNumber, { purpose: "toOutside", massText: "" }))).rejects.toMatchObject({ fieldErrors: { massText: [expect.any(String)] } });
});

test("away goods come back before anything else, and what is not away cannot come back", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  await expect(recordHandOver(ctx, move(itemNumber, { purpose: "fromOutside" }))).rejects.toMatchObject({ code: "conflict" });
  await recordHandOver(ctx, move(itemNumber, { purpose: "toOutside", toPlace: "Outside laboratory", seal: "S-11" }));
  await expect(recordHandOver(ctx, move(itemNumber))).rejects.toMatchObject({ userMessage: "This item is away: the next entry is its return." });
  await recordHandOver(ctx, move(itemNumber, { purpose: "fromOutside", toPlace: "Safe 1" }));
});

test("only somebody of this laboratory can hold goods; another laboratory's item is not found; an appraiser moves nothing", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const { itemNumber } = await aTakenInItem(ours);
  await expect(recordHandOver(ours, move(itemNumber, { holder: theirs.actorId }))).rejects.toMatchObject({ fieldErrors: { holder: [expect.any(String)] } });
  await expect(recordHandOver(theirs, move(itemNumber))).rejects.toMatchObject({ code: "not_found" });
  await expect(releaseItem(theirs, release(itemNumber))).rejects.toMatchObject({ code: "not_found" });
  await expect(recordHandOver(await aMember(ours, ["appraiser"]), move(itemNumber))).rejects.toMatchObject({ code: "forbidden" });
  await expect(releaseItem(await aMember(ours, ["gemmologist"]), release(itemNumber))).rejects.toMatchObject({ code: "forbidden" });
  expect(await listCustody(theirs, itemNumber)).toEqual([]);
});

test("goods are released when paid, weighed and agreed, once", async () => {
  const ctx = await aLab();
  const { itemId, itemNumber } = await aTakenInItem(ctx);
  await expect(releaseItem(ctx, release(itemNumber))).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("is not paid") });
  await pay(ctx);
  await expect(releaseItem(ctx, release(itemNumber, { isConditionAgreed: false }))).rejects.toMatchObject({ fieldErrors: { isConditionAgreed: [expect.any(String)] } });
  await expect(releaseItem(ctx, release(itemNumber, { massText: "" }))).rejects.toMatchObject({ fieldErrors: { massText: [expect.any(String)] } });
  await expect(releaseItem(ctx, release(itemNumber, { massText: "2.1" }))).rejects.toMatchObject({ fieldErrors: { massText: [expect.stringContaining("0.043 ct less")] } });
  await releaseItem(ctx, release(itemNumber));
  const [stone] = await ctx.db.select().from(stones).where(eq(stones.itemId, itemId));
  expect(stone).toMatchObject({ goodsState: "released", holderId: null, place: "L. Ardenne" });
  await expect(releaseItem(ctx, release(itemNumber))).rejects.toMatchObject({ userMessage: "This item was released and is no longer in our custody." });
});

test("a release sent twice releases once, and answers the second time as the first", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  await pay(ctx);
  const once = release(itemNumber);
  await releaseItem(ctx, once);
  await releaseItem(ctx, once);
  expect(await listCustody(ctx, itemNumber)).toHaveLength(2);
});

test("goods at the bench are not released, and a client with account terms need not have paid", async () => {
  const ctx = await aLab();
  const { itemNumber } = await aTakenInItem(ctx);
  await ctx.db.update(clients).set({ terms: "account" }).where(eq(clients.laboratoryId, ctx.laboratoryId));
  await recordHandOver(ctx, move(itemNumber));
  await expect(releaseItem(ctx, release(itemNumber))).rejects.toMatchObject({ userMessage: "This item is at the bench. Bring it back to the safe, then release it." });
  await recordHandOver(ctx, move(itemNumber, { purpose: "toSafe", toPlace: "Safe 1" }));
  await releaseItem(ctx, release(itemNumber));
});
