import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { stones, valuationComparables } from "#app/db/schema/index.ts";
import { certificationPoints } from "#app/domain/valuation.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { getValuation } from "#app/features/valuations/get-valuation.server.ts";
import { saveAndSignValuation } from "#app/features/valuations/save-and-sign-valuation.server.ts";
import { saveValuation } from "#app/features/valuations/save-valuation.server.ts";
import { signValuation } from "#app/features/valuations/sign-valuation.server.ts";
import type { ValuationInput } from "#app/features/valuations/valuation-forms.server.ts";
import { aConcludedStone } from "../../setup/conclusion-factory.ts";
import { aCheckedStone } from "../../setup/checked-stone-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";

type Comparable = ValuationInput["comparables"][number];
const comparable = (amountMinor: number, fields: Partial<Comparable> = {}): Comparable => ({
  kind: "retailAsk", reference: "Shop window 3", description: "Oval, like size", onDate: "2026-11-20", place: "Port Ellery", amount: String(amountMinor / 100), amountMinor, currency: "EUR",
  exchangeRate: 1, adjustmentFactor: 1, adjustmentReason: "", isSold: false, isPremiumIncluded: false, isTaxIncluded: true, ...fields,
});
const valuation = (fields: Partial<ValuationInput> = {}): ValuationInput => ({
  rowVersion: 0, purpose: "Insurance scheduling", intendedUse: "The owner's policy", intendedUsers: "The owner and their insurer", valueType: "retailReplacementNew", valueDefinition: "As the insurer words it", valueDefinitionSource: "the policy", marketLevel: "retailIndependent", marketPlace: "Port Ellery",
  inspection: "In hand", inspectedOn: "2026-12-01", effectiveOn: "2026-12-01", currency: "EUR", amount: "700", amountMinor: 70_000, isTaxIncluded: true, approachReasoning: "The middle of what is asked", otherApproachesWhyNot: "", limitingConditions: ["For the purpose stated only"], certification: [...certificationPoints], priorServices: "",
  comparables: [comparable(64_000), comparable(76_000)], ...fields,
});

async function setting() {
  const ctx = await aLab();
  const appraiser = await aMember(ctx, ["appraiser"]);
  const stone = await aCheckedStone(ctx, { isValuationOrdered: true });
  return { ctx, appraiser, stone };
}

test("a declared value and the fee are hidden from the appraiser until the valuation is signed", async () => {
  const { appraiser, stone } = await setting();
  const before = await getValuation(appraiser, stone);
  expect(before.afterSigning).toBeNull();
  await saveValuation(appraiser, { ...stone, input: valuation() });
  // 6,500.00 was declared (the take-in factory); 138.00 is the fee with its tax.
  expect(JSON.stringify(await getValuation(appraiser, stone))).not.toMatch(/650000|6.?500\.00|138\.00|13800/);
  await signValuation(appraiser, { ...stone, rowVersion: 1 });
  expect(await getValuation(appraiser, stone)).toMatchObject({ valuation: { state: "signed", amountMinor: 70_000 }, afterSigning: { declaredValue: expect.stringMatching(/6.?500\.00/), fee: expect.stringContaining("138.00") } });
});

test("only a checked identity is valued, and only where the client ordered it", async () => {
  const { ctx, appraiser } = await setting();
  const notOrdered = await aCheckedStone(ctx);
  await expect(saveValuation(appraiser, { ...notOrdered, input: valuation() })).rejects.toThrow(/did not order/);
  const notChecked = await aConcludedStone(ctx);
  await ctx.db.update(stones).set({ isValuationOrdered: true }).where(eq(stones.id, notChecked.stoneId));
  await expect(saveValuation(appraiser, { ...notChecked, input: valuation() })).rejects.toThrow(/checked identity/);
});

test("a stale draft is refused and overwrites nothing", async () => {
  const { appraiser, stone } = await setting();
  await saveValuation(appraiser, { ...stone, input: valuation({ purpose: "First" }) });
  await expect(saveValuation(appraiser, { ...stone, input: valuation({ purpose: "Made from nothing" }) })).rejects.toMatchObject({ code: "conflict" });
  await saveValuation(appraiser, { ...stone, input: valuation({ rowVersion: 1, purpose: "Second" }) });
  await expect(saveValuation(appraiser, { ...stone, input: valuation({ rowVersion: 1, purpose: "Stale" }) })).rejects.toMatchObject({ code: "conflict" });
  await expect(signValuation(appraiser, { ...stone, rowVersion: 1 })).rejects.toMatchObject({ code: "conflict" });
  expect((await getValuation(appraiser, stone)).valuation).toMatchObject({ purpose: "Second", rowVersion: 2 });
});

test.each([
  ["amount", { amount: "", amountMinor: null }],
  ["comparables", { comparables: [] }],
  ["approachReasoning", { approachReasoning: " " }],
  ["limitingConditions", { limitingConditions: [] }],
  ["certification", { certification: certificationPoints.slice(1) }],
] as const)("a signature is refused without %s, at that field, and the draft stays as it was", async (field, fields) => {
  const { appraiser, stone } = await setting();
  await expect(saveAndSignValuation(appraiser, { ...stone, input: valuation(fields as Partial<ValuationInput>) })).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { [field]: [expect.any(String)] } });
  expect((await getValuation(appraiser, stone)).valuation).toBeNull();
});

test("comparables are brought to the currency and adjusted, rounded half to even once", async () => {
  const { ctx, appraiser, stone } = await setting();
  await saveValuation(appraiser, { ...stone, input: valuation({ comparables: [comparable(10_001, { currency: "USD", exchangeRate: 0.5, adjustmentFactor: 1 }), comparable(80_000, { adjustmentFactor: 0.95, adjustmentReason: "larger" })] }) });
  const rows = await ctx.db.select({ adjustedMinor: valuationComparables.adjustedMinor }).from(valuationComparables).where(eq(valuationComparables.laboratoryId, ctx.laboratoryId)).orderBy(valuationComparables.position);
  expect(rows.map(({ adjustedMinor }) => adjustedMinor)).toEqual([5_000, 76_000]); // 5000.5 goes to the even 5000
});

test("a report with a valuation is the appraiser's to authorise, once it is signed", async () => {
  const { ctx, appraiser, stone } = await setting();
  await expect(authoriseReport(appraiser, stone)).rejects.toThrow(/not signed yet/);
  await saveAndSignValuation(appraiser, { ...stone, input: valuation() });
  await expect(authoriseReport(await aMember(ctx, ["gemmologist"]), stone)).rejects.toMatchObject({ code: "forbidden" });
  expect(await authoriseReport(appraiser, stone)).toMatch(/-R-26-00001$/);
  await expect(saveValuation(appraiser, { ...stone, input: valuation() })).rejects.toMatchObject({ code: "conflict" });
});
