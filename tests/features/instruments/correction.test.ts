import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { observationValues, stones } from "#app/db/schema/index.ts";
import type { InstrumentCheckId } from "#app/domain/ids.ts";
import { applyCorrection } from "#app/features/instruments/apply-correction.ts";
import { endCorrection } from "#app/features/instruments/end-correction.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { previewCorrection } from "#app/features/instruments/preview-correction.server.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { startCorrection } from "#app/features/instruments/start-correction.server.ts";
import { composeReading } from "#app/features/readings/compose-reading.ts";
import { evidenceFromReadings } from "#app/features/readings/evidence-from-readings.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { correctionText, readingValueText } from "#app/features/readings/reading-words.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aLab, aMember, anInstrument, later } from "../../setup/factories.ts";
import { aCheck, aCorrectedInstrument } from "../../setup/instrument-factory.ts";

test("a correction from two checks is added to later readings and to nothing before, and what was shown is kept", async () => {
  const ctx = await aLab();
  const { instrumentId } = await aCorrectedInstrument(ctx);
  const bench = await aBench(ctx);
  const read = { ...bench, instruments: { ...bench.instruments, refractometer: instrumentId } };
  // 1.544 − 1.5436 and 1.728 − 1.7271: the mean of 0.0004 and 0.0009.
  await recordReading(later(ctx, 10_000), aReading(read, corundum.refractometer));
  await recordReading(later(ctx, 20_000), aReading(bench, corundum.refractometer));
  const [corrected, plain] = await listReadings(ctx, bench);
  const of = (reading: typeof corrected, name: string) => reading!.values.find((value) => value.name === name)!;
  expect(of(corrected, "low")).toMatchObject({ value: 1.76265, rawValue: 1.762, typedText: "1.762", formula: null });
  expect(of(corrected, "high")).toMatchObject({ value: 1.77065, rawValue: 1.77 });
  // 0.0015 of the reading and 0.0015/√2 of the correction, squared and added.
  expect(of(corrected, "low").standardUncertainty).toBeCloseTo(Math.hypot(0.0015, 0.0015 / Math.SQRT2), 7);
  // The offset is in both edges: the gap between them is as it was, and known as well.
  expect(of(corrected, "birefringence")).toMatchObject({ value: of(plain, "birefringence").value, standardUncertainty: of(plain, "birefringence").standardUncertainty });
  expect(of(plain, "low")).toMatchObject({ value: 1.762, rawValue: null });
  expect(evidenceFromReadings([corrected!]).ri).toMatchObject([{ low: 1.76265, high: 1.77065 }]);
  // A stored 1.76265 is written with one figure more than was read; halves go with the binary number.
  expect(readingValueText(corrected!)).toMatch(/^1\.762[67] – 1\.770[67]$/);
  expect(correctionText(corrected!.values)).toMatch(/^read 1\.762 – 1\.770, corrected by \+0\.000[67]$/);
  expect(correctionText(plain!.values)).toBe("");
  const rows = await ctx.db.select({ rawValue: observationValues.rawValue, value: observationValues.value }).from(observationValues).where(eq(observationValues.laboratoryId, ctx.laboratoryId));
  expect(rows.filter(({ rawValue }) => rawValue !== null)).toHaveLength(2);
});

test("a line corrects by more at one end of the scale than at the other, and by its own uncertainty there", async () => {
  const ctx = await aLab();
  const { instrumentId, checkIds } = await aCorrectedInstrument(ctx, { model: "line" });
  const { correction, residuals } = await previewCorrection(ctx, instrumentId, { checkIds, model: "line" });
  for (const residual of residuals) expect(residual).toBeCloseTo(0, 9);
  const at = (value: number) => applyCorrection({ correction, unit: "n" }, { value, unit: "n" })!;
  expect(at(1.5436).value).toBeCloseTo(1.544, 9);
  expect(at(1.7271).value).toBeCloseTo(1.728, 9);
  expect(at(1.5436).u).toBeCloseTo(0.0015, 7);
  expect(at(1.45).u).toBeGreaterThan(at(1.63).u);
});

test("a balance's offset drops out of what a beaker gains, and grams correct carats", () => {
  const offset = { correction: { model: "offset", centre: 10, offset: 0.002, slope: 0, uOffset: 0.001, uSlope: 0 }, unit: "g" } as const;
  expect(applyCorrection(offset, { value: 2, unit: "ct" })).toMatchObject({ value: 2.01, added: 0.01, u: 0.005 });
  expect(applyCorrection(offset, { value: 0.5, unit: "ct", isDifference: true })).toMatchObject({ value: 0.5, added: 0 });
  expect(applyCorrection(offset, { value: 21.4, unit: "degC" })).toBeUndefined();
  expect(applyCorrection(null, { value: 2, unit: "ct" })).toBeUndefined();
});

test("weights, densities and angles are corrected before anything follows from them; the liquid's limit is not", () => {
  const balance = { resolution: 0.001, standardUncertainty: null, upperLimit: null, prismIndex: null };
  const correction = { correction: { model: "offset", centre: 5, offset: 0.01, slope: 0, uOffset: 0.002, uSlope: 0 }, unit: "ct" } as const;
  const sg = (instrument: Parameters<typeof composeReading>[1], draft: Parameters<typeof composeReading>[0] = corundum.density) => composeReading(draft, instrument).reading!.values.find(({ name }) => name === "sg")!;
  // Both weighings are 0.01 too low, so the loss in water is right and the weight in air alone moves the density.
  expect(sg({ ...balance, correction }).value / sg(balance).value).toBeCloseTo(2.153 / 2.143, 4);
  expect(sg({ ...balance, correction }).standardUncertainty!).toBeGreaterThan(sg(balance).standardUncertainty!);
  const angle = { resolution: 0.01, standardUncertainty: null, upperLimit: null, prismIndex: 1.88 };
  const tilted = { correction: { model: "offset", centre: 55, offset: 0.05, slope: 0, uOffset: 0.01, uSlope: 0 }, unit: "deg" } as const;
  const n = composeReading({ kind: "criticalAngle", quality: "good", angleDeg: "55.18", prismN: "1.880", facet: "table", light: "sodium" }, { ...angle, correction: tilted }).reading!.values.find(({ name }) => name === "n")!;
  expect(n.value).toBeCloseTo(1.88 * Math.sin((55.23 * Math.PI) / 180), 6);
  const limit = composeReading({ kind: "overLimit", quality: "good", limit: "1.81", facet: "table", light: "sodium" }, { ...balance, correction: { ...tilted, unit: "n" } }).reading!.values[0];
  expect(limit).toMatchObject({ value: 1.81 });
  expect(limit).not.toHaveProperty("rawValue");
});

test("the logbook's weight is the corrected one, in the balance's figures", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  const checks = [aCheck({ referenceMaterial: "check weight", nominal: "5", reading: "4.990", limit: "0.02" })];
  await recordInstrumentCheck(later(ctx, 1000), bench.instruments.balance, checks[0]!);
  await startCorrection(later(ctx, 2000), bench.instruments.balance, { requestId: newId<"instrumentCorrection">(), checkIds: [checks[0]!.requestId], model: "offset", reason: "moved" });
  await recordReading(later(ctx, 3000), aReading(bench, corundum.weight));
  const [stone] = await ctx.db.select({ weightCt: stones.weightCt, weightText: stones.weightText }).from(stones).where(eq(stones.id, bench.stoneId));
  expect(stone).toEqual({ weightCt: 2.153, weightText: "2.153" });
});

test("with a correction in force a check is judged corrected, and its deviation told so", async () => {
  const ctx = await aLab();
  const { instrumentId } = await aCorrectedInstrument(ctx);
  // 1.5417 is 0.0023 off and beyond its limit; corrected by 0.00065 it is within.
  expect(await recordInstrumentCheck(later(ctx, 60_000), instrumentId, aCheck({ reading: "1.5417" }))).toEqual({ isPassed: true });
  expect((await getInstrument(later(ctx, 61_000), instrumentId)).checks[0]).toMatchObject({ readingText: "1.5417", readingValue: 1.5417, correctedValue: 1.54235, isPassed: true });
});

test("a correction ends, or the next takes its place; sent twice it starts once", async () => {
  const ctx = await aLab();
  const { instrumentId, checkIds } = await aCorrectedInstrument(ctx);
  const input = { requestId: newId<"instrumentCorrection">(), checkIds, model: "line" as const, reason: "two references" };
  await startCorrection(later(ctx, 10_000), instrumentId, input);
  await startCorrection(later(ctx, 11_000), instrumentId, input);
  const { corrections } = await getInstrument(ctx, instrumentId);
  expect(corrections.map(({ correction, endedAt }) => [correction.model, endedAt === null])).toEqual([["line", true], ["offset", false]]);
  await endCorrection(later(ctx, 20_000), instrumentId, { reason: "serviced" });
  expect((await getInstrument(ctx, instrumentId)).corrections.every(({ endedAt }) => endedAt !== null)).toBe(true);
  await expect(endCorrection(later(ctx, 30_000), instrumentId, { reason: "serviced" })).rejects.toMatchObject({ code: "conflict" });
});

test("what gives no correction is refused beside the checks", async () => {
  const ctx = await aLab();
  const { instrumentId, checkIds } = await aCorrectedInstrument(ctx);
  const other = await aCorrectedInstrument(ctx);
  const refusal = (choice: { checkIds: readonly InstrumentCheckId[]; model: "offset" | "line" }, id = instrumentId) => previewCorrection(ctx, id, choice).catch((error: { code: string; fieldErrors: Record<string, string[]> }) => [error.code, error.fieldErrors.checks?.[0]]);
  expect(await refusal({ checkIds: [], model: "offset" })).toEqual(["invalid_input", expect.stringContaining("Choose the checks")]);
  expect(await refusal({ checkIds: [checkIds[0]!], model: "line" })).toEqual(["invalid_input", expect.stringContaining("two references")]);
  expect(await refusal({ checkIds: [other.checkIds[0]!], model: "offset" })).toEqual(["invalid_input", expect.stringContaining("no check of this instrument")]);
  const unknown = await anInstrument(ctx, { kind: "spectroscope", resolution: null });
  const line = aCheck({ referenceMaterial: "sodium", nominal: "589.3", reading: "590", limit: "2" });
  await recordInstrumentCheck(ctx, unknown, line);
  expect(await refusal({ checkIds: [line.requestId], model: "offset" }, unknown)).toEqual(["invalid_input", expect.stringContaining("standard uncertainty")]);
  const stretched = [aCheck({ referenceMaterial: "low", nominal: "1.4", reading: "1.400", limit: "1" }), aCheck({ referenceMaterial: "high", nominal: "1.9", reading: "1.600", limit: "1" })];
  for (const check of stretched) await recordInstrumentCheck(ctx, instrumentId, check);
  expect(await refusal({ checkIds: stretched.map(({ requestId }) => requestId), model: "line" })).toEqual(["invalid_input", expect.stringContaining("more than a fifth")]);
});

test("corrections are the laboratory's own, and the desk and the appraiser start none", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const { instrumentId, checkIds } = await aCorrectedInstrument(ours);
  const input = { requestId: newId<"instrumentCorrection">(), checkIds, model: "offset" as const, reason: "x" };
  await expect(startCorrection(theirs, instrumentId, input)).rejects.toMatchObject({ code: "not_found" });
  await expect(endCorrection(theirs, instrumentId, { reason: "x" })).rejects.toMatchObject({ code: "not_found" });
  for (const role of ["desk", "appraiser"] as const) await expect(startCorrection(await aMember(ours, [role]), instrumentId, input)).rejects.toMatchObject({ code: "forbidden" });
});
