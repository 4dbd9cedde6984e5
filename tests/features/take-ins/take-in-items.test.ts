import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents, custodyEvents, invoices, itemConsents, items, laboratories, stoneEvents, stones, takeIns } from "#app/db/schema/index.ts";
import { consentCodes } from "#app/domain/consent-code.ts";
import { getCustodyStanding } from "#app/features/custody/get-custody-standing.server.ts";
import { getTakeIn } from "#app/features/take-ins/get-take-in.server.ts";
import { takeInItems } from "#app/features/take-ins/take-in-items.server.ts";
import { aClient, aLab, aMember, anInstrument, later } from "../../setup/factories.ts";
import { itemInput, takeInInput } from "../../setup/take-in-factory.ts";

test("goods taken in get numbers of the laboratory and the year, stones, consents, a hand-over and an invoice", async () => {
  const ctx = await aLab();
  const balance = await anInstrument(ctx);
  const input = await takeInInput(ctx, {
    isValuationWanted: true,
    items: [itemInput(balance), itemInput(balance, { description: "Blue cushion in a white metal ring", mount: "mounted", stoneCount: 3, massText: "4.182", massUnit: "g" })],
  });
  const { takeInId, number } = await takeInItems(ctx, input);
  const prefix = ctx.laboratory.prefix;
  expect(number).toBe(`${prefix}-T-26-0001`);

  const rows = await ctx.db.select().from(stones).where(eq(stones.takeInId, takeInId)).orderBy(stones.code);
  expect(rows.map((row) => row.code)).toEqual([`${prefix}-26-0001-1`, `${prefix}-26-0002-1`, `${prefix}-26-0002-2`, `${prefix}-26-0002-3`]);
  expect(rows[0]).toMatchObject({ weightCt: 2.143, weightText: "2.143", isMounted: false, goodsState: "safe", examinationState: "received", isValuationOrdered: true, place: "Safe 1" });
  expect(rows[1]).toMatchObject({ weightCt: null, weightText: "", isMounted: true });
  expect(await ctx.db.select({ code: itemConsents.code }).from(itemConsents).where(and(eq(itemConsents.itemId, rows[0]!.itemId), eq(itemConsents.isGiven, true)))).toHaveLength(3);
  expect(await ctx.db.select({ code: itemConsents.code }).from(itemConsents).where(eq(itemConsents.itemId, rows[0]!.itemId))).toHaveLength(consentCodes.length);
  expect(await ctx.db.select().from(custodyEvents).where(eq(custodyEvents.itemId, rows[0]!.itemId))).toMatchObject([{ purpose: "received", sequence: 1, massText: "2.143", massUnit: "ct", toPlace: "Safe 1" }]);
  expect(await ctx.db.select().from(stoneEvents).where(eq(stoneEvents.stoneId, rows[0]!.id))).toHaveLength(2);
  const [invoice] = await ctx.db.select().from(invoices).where(eq(invoices.takeInId, takeInId));
  expect(invoice).toMatchObject({ state: "open", netMinor: 4 * (8500 + 3000 + 12000), currency: "EUR" });
  const [takeIn] = await ctx.db.select().from(takeIns).where(eq(takeIns.id, takeInId));
  expect(takeIn).toMatchObject({ services: ["identification", "secondCheck", "valuation"], dueOn: "2026-12-08", feeAgreedAt: ctx.now });
});

test("the number carries the year of the laboratory's own clock", async () => {
  const ctx = await aLab({ now: new Date("2026-12-31T23:30:00Z") });
  const tokyo = { ...ctx, laboratory: { ...ctx.laboratory, timeZone: "Asia/Tokyo" } };
  const { number } = await takeInItems(tokyo, await takeInInput(tokyo));
  expect(number).toContain("-T-27-0001");
});

test("the same form sent twice makes one take-in, also at the same moment", async () => {
  const ctx = await aLab();
  const input = await takeInInput(ctx);
  const [first, second] = await Promise.all([takeInItems(ctx, input), takeInItems(ctx, input)]);
  const third = await takeInItems(later(ctx, 60_000), input);
  expect(second).toEqual(first);
  expect(third).toEqual(first);
  expect(await ctx.db.select({ id: takeIns.id }).from(takeIns).where(eq(takeIns.laboratoryId, ctx.laboratoryId))).toHaveLength(1);
  expect(await ctx.db.select({ id: items.id }).from(items).where(eq(items.laboratoryId, ctx.laboratoryId))).toHaveLength(1);
});

test("take-ins at the same moment get numbers without gaps", async () => {
  const ctx = await aLab();
  const inputs = await Promise.all(Array.from({ length: 6 }, () => takeInInput(ctx)));
  const made = await Promise.all(inputs.map((input) => takeInItems(ctx, input)));
  expect(made.map(({ number }) => number.slice(-4)).sort()).toEqual(["0001", "0002", "0003", "0004", "0005", "0006"]);
});

test("a new client is made with the take-in, and not without it", async () => {
  const ctx = await aLab();
  const client = { new: { name: "Holm Lane Antiques", contactName: "", email: "", phone: "", addressLines: ["3 Holm Lane"], note: "" } };
  const { number } = await takeInItems(ctx, await takeInInput(ctx, { client }));
  expect((await getTakeIn(ctx, number)).client).toMatchObject({ name: "Holm Lane Antiques", addressLines: ["3 Holm Lane"] });
});

test("a strand is examined as one piece, whatever its beads", async () => {
  const ctx = await aLab();
  const input = await takeInInput(ctx);
  const { number } = await takeInItems(ctx, { ...input, items: [{ ...input.items[0]!, description: "Black bead strand, 61", mount: "strung", stoneCount: 61, massText: "41.2", massUnit: "g" }] });
  const view = await getTakeIn(ctx, number);
  expect(view.items[0]!.stones).toHaveLength(1);
  expect(view.items[0]!.stoneCount).toBe(61);
});

test("another laboratory's client or balance is not found", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const input = await takeInInput(ours);
  await expect(takeInItems(ours, { ...input, client: { id: await aClient(theirs) } })).rejects.toMatchObject({ code: "not_found" });
  await expect(takeInItems(ours, { ...input, items: [itemInput(await anInstrument(theirs))] })).rejects.toMatchObject({ fieldErrors: { "items[0].balanceId": ["There is no such balance."] } });
  const { number } = await takeInItems(ours, input);
  await expect(getTakeIn(theirs, number)).rejects.toMatchObject({ code: "not_found" });
});

test("a gemmologist or an appraiser takes nothing in, and sees no declared value or invoice", async () => {
  const ctx = await aLab();
  const gemmologist = await aMember(ctx, ["gemmologist", "appraiser"]);
  await expect(takeInItems(gemmologist, await takeInInput(ctx))).rejects.toMatchObject({ code: "forbidden" });
  const { number } = await takeInItems(ctx, await takeInInput(ctx));
  const seen = await getTakeIn(gemmologist, number);
  expect(seen.items[0]).toMatchObject({ declaredValueMinor: null, declaredCurrency: null });
  expect(seen.invoice).toBeNull();
  expect((await getTakeIn(ctx, number)).items[0]!.declaredValueMinor).toBe(650_000);
  await expect(getCustodyStanding(gemmologist)).rejects.toMatchObject({ code: "forbidden" });
});

test("conclusions, absurd counts, weights and dates are refused beside their fields, and nothing is kept", async () => {
  const ctx = await aLab();
  const input = await takeInInput(ctx);
  const bad = (fields: Partial<(typeof input.items)[number]>) => takeInItems(ctx, { ...input, items: [{ ...input.items[0]!, ...fields }] });
  await expect(bad({ description: "ruby" })).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { "items[0].description": [expect.stringContaining("ruby")] } });
  await expect(bad({ condition: "gold worn" })).rejects.toMatchObject({ fieldErrors: { "items[0].condition": [expect.stringContaining("gold")] } });
  for (const massText of ["-1", "0", "1000000000", "many", "", "1.23456", "1e3"]) await expect(bad({ massText })).rejects.toMatchObject({ fieldErrors: { "items[0].massText": [expect.any(String)] } });
  for (const stoneCount of [0, -1, 101, 1.5, Number.NaN, 1e9]) await expect(bad({ stoneCount })).rejects.toMatchObject({ fieldErrors: { "items[0].stoneCount": [expect.any(String)] } });
  await expect(takeInItems(ctx, { ...input, dueOn: "2026-11-30" })).rejects.toMatchObject({ fieldErrors: { dueOn: [expect.any(String)] } });
  await expect(takeInItems(ctx, { ...input, dueOn: "2126-11-30" })).rejects.toMatchObject({ fieldErrors: { dueOn: [expect.any(String)] } });
  await expect(takeInItems(ctx, { ...input, items: [] })).rejects.toMatchObject({ code: "invalid_input" });
  expect(await ctx.db.select({ id: takeIns.id }).from(takeIns).where(eq(takeIns.laboratoryId, ctx.laboratoryId))).toEqual([]);
});

test("a balance out of service weighs nothing", async () => {
  const ctx = await aLab();
  const balance = await anInstrument(ctx, { name: "B9", status: "outOfService", statusReason: "Failed its check" });
  await expect(takeInItems(ctx, await takeInInput(ctx, { items: [itemInput(balance)] }))).rejects.toMatchObject({ code: "conflict", userMessage: "B9 is out of service. Weigh on another balance." });
});

test("above the insurer's limit only an owner takes goods in, and says why", async () => {
  const ctx = await aLab();
  await ctx.db.update(laboratories).set({ custodyLimitMinor: 1_000_000 }).where(eq(laboratories.id, ctx.laboratoryId));
  const desk = await aMember(ctx, ["desk"]);
  await takeInItems(desk, await takeInInput(desk));
  expect(await getCustodyStanding(desk)).toEqual({ heldMinor: 650_000, limitMinor: 1_000_000 });
  const second = await takeInInput(desk);
  await expect(takeInItems(desk, { ...second, limitOverrideNote: "I may not decide this" })).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("ask an owner") });
  await expect(takeInItems(ctx, second)).rejects.toMatchObject({ fieldErrors: { limitOverrideNote: [expect.stringContaining("13\u202f000.00 EUR")] } });
  await takeInItems(ctx, { ...second, limitOverrideNote: "Insurer agreed by telephone until Friday" });
  expect(await getCustodyStanding(ctx)).toMatchObject({ heldMinor: 1_300_000 });
  const audits = await ctx.db.select().from(auditEvents).where(and(eq(auditEvents.laboratoryId, ctx.laboratoryId), eq(auditEvents.action, "custodyLimit.overridden")));
  expect(audits).toMatchObject([{ reason: "Insurer agreed by telephone until Friday", detail: { heldMinor: 650_000, declaredMinor: 650_000, limitMinor: 1_000_000 } }]);
  await expect(takeInItems(desk, await takeInInput(desk, { items: [{ ...second.items[0]!, declaredValue: null }] }))).resolves.toBeDefined();
});

test("two take-ins at once cannot pass the limit together", async () => {
  const ctx = await aLab({ roles: ["desk"] });
  await ctx.db.update(laboratories).set({ custodyLimitMinor: 1_000_000 }).where(eq(laboratories.id, ctx.laboratoryId));
  const inputs = await Promise.all([takeInInput(ctx), takeInInput(ctx), takeInInput(ctx)]);
  const outcomes = await Promise.allSettled(inputs.map((input) => takeInItems(ctx, input)));
  expect(outcomes.filter((outcome) => outcome.status === "fulfilled")).toHaveLength(1);
});

test("a sole practice has no second check to charge for", async () => {
  const ctx = await aLab({ isSolePractice: true });
  const { number } = await takeInItems(ctx, await takeInInput(ctx));
  const view = await getTakeIn(ctx, number);
  expect(view.services).toEqual(["identification"]);
  expect(view.invoice).toMatchObject({ netMinor: 8500, taxMinor: 1700, totalMinor: 10_200 });
});

test("scripts, emoji and other scripts in a description are kept as they are", async () => {
  const ctx = await aLab();
  const description = `<script>alert(1)</script> 红色椭圆 💎 "quoted" 'n' =1+1`;
  const { number } = await takeInItems(ctx, await takeInInput(ctx, { items: [itemInput(await anInstrument(ctx), { description })], clientStatements: "ruby, says the client 💎" }));
  const view = await getTakeIn(ctx, number);
  expect(view.items[0]!.description).toBe(description);
  expect(view.clientStatements).toBe("ruby, says the client 💎");
});
