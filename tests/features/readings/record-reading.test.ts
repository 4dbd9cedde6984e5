import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { instruments, observationValues, observations, stoneEvents, stones } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aLab, aMember, later } from "../../setup/factories.ts";

const gemmologist = () => aLab({ roles: ["owner", "gemmologist", "desk"] });
const stoneOf = async (ctx: LabContext, code: string) => (await ctx.db.select().from(stones).where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, code))))[0]!;

test("the first reading begins the examination and makes its observer the examiner", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  expect(await recordReading(ctx, aReading(bench, corundum.refractometer))).toEqual({ sequence: 1, warnings: [] });
  expect(await stoneOf(ctx, bench.stoneCode)).toMatchObject({ examinationState: "examining", examinerId: ctx.actorId, observationCount: 1 });
  const events = await ctx.db.select().from(stoneEvents).where(and(eq(stoneEvents.stoneId, bench.stoneId), eq(stoneEvents.machine, "examination"), eq(stoneEvents.toState, "examining")));
  expect(events).toMatchObject([{ fromState: "received", by: ctx.actorId, why: "First reading" }]);
});

test("digits stay as they were typed, and what follows from them names its formula", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, { ...corundum.refractometer, low: "1,760", high: "1.768" }));
  const [reading] = await listReadings(ctx, bench);
  const value = (name: string) => reading!.values.find((one) => one.name === name);
  expect(value("low")).toMatchObject({ value: 1.76, typedText: "1,760", standardUncertainty: 0.0015, formula: null });
  expect(value("birefringence")).toMatchObject({ value: 0.008, typedText: "", standardUncertainty: 0.0012, formula: "difference of edges v1" });
});

test("a density is computed from its weighings with its uncertainty", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, { ...corundum.density, massAirCt: "5.216", massLiquidCt: "3.914", tempC: "21.5" }));
  const [reading] = await listReadings(ctx, bench);
  const sg = reading!.values.find(({ name }) => name === "sg")!;
  // The worked example of the formula sheet: 3994.1 kg/m³, u 12.8.
  expect(sg.value).toBeCloseTo(3.9942, 3);
  expect(sg.standardUncertainty).toBeCloseTo(0.0128, 3);
  expect(sg.formula).toContain("v1");
});

test("a critical angle gives its index through the prism", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, { kind: "criticalAngle", quality: "good", angleDeg: "55.00", prismN: "1.88", facet: "table", light: "sodium" }));
  const [reading] = await listReadings(ctx, bench);
  expect(reading!.values.find(({ name }) => name === "n")).toMatchObject({ value: 1.5400058, formula: expect.stringContaining("v1") });
});

test("a reading sent twice is kept once, even at the same instant", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const once = aReading(bench, corundum.weight);
  const answers = await Promise.all([recordReading(ctx, once), recordReading(ctx, once)]);
  expect(new Set(answers.map(({ sequence }) => sequence))).toEqual(new Set([1]));
  expect(await recordReading(ctx, once)).toMatchObject({ sequence: 1 });
  expect(await listReadings(ctx, bench)).toHaveLength(1);
});

test("readings made at the same instant take numbers one after the other", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await Promise.all(Array.from({ length: 8 }, () => recordReading(ctx, aReading(bench, corundum.free))));
  expect((await listReadings(ctx, bench)).map(({ sequence }) => sequence)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
});

test("a good weighing of a loose stone becomes the weight in the logbook", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, { ...corundum.weight, weightCt: "2,140" }));
  expect(await stoneOf(ctx, bench.stoneCode)).toMatchObject({ weightCt: 2.14, weightText: "2.140" });
});

test("water and contact liquid wait for the client's consent", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx, { consents: ["dryCloth"] });
  await expect(recordReading(ctx, aReading(bench, corundum.density))).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { quality: [expect.stringContaining("not agreed to weighing in water")] } });
  await expect(recordReading(ctx, aReading(bench, corundum.refractometer))).rejects.toMatchObject({ fieldErrors: { quality: [expect.stringContaining("contact liquid")] } });
  await recordReading(ctx, aReading(bench, { ...corundum.refractometer, quality: "noResult", low: "", high: "" }, { noResultReason: "consent refused" }));
  expect(await listReadings(ctx, bench)).toMatchObject([{ quality: "noResult", noResultReason: "consent refused", values: [] }]);
});

test("a mounted stone is neither weighed by itself nor in water", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx, { mount: "mounted", massUnit: "g", massText: "4.21" });
  await expect(recordReading(ctx, aReading(bench, corundum.density))).rejects.toMatchObject({ fieldErrors: { quality: [expect.stringContaining("mounted stone is not weighed in water")] } });
  await expect(recordReading(ctx, aReading(bench, corundum.weight))).rejects.toMatchObject({ fieldErrors: { quality: [expect.stringContaining("cannot be weighed by itself")] } });
});

test("an instrument of the wrong kind, out of service or of another laboratory is refused", async () => {
  const [ctx, theirs] = [await gemmologist(), await gemmologist()];
  const [bench, other] = [await aBench(ctx), await aBench(theirs)];
  const on = (instrumentId: typeof bench.instruments.gauge | null) => recordReading(ctx, aReading(bench, corundum.refractometer, { instrumentId }));
  await expect(on(bench.instruments.gauge)).rejects.toMatchObject({ fieldErrors: { instrument: [expect.stringContaining("another kind of instrument")] } });
  await expect(on(other.instruments.refractometer)).rejects.toMatchObject({ fieldErrors: { instrument: ["Choose an instrument of this laboratory."] } });
  await expect(on(null)).rejects.toMatchObject({ fieldErrors: { instrument: ["Choose the instrument that showed it."] } });
  await ctx.db.update(instruments).set({ status: "outOfService", statusReason: "prism scratched" }).where(eq(instruments.id, bench.instruments.refractometer));
  await expect(on(bench.instruments.refractometer)).rejects.toMatchObject({ fieldErrors: { instrument: [expect.stringContaining("out of service: prism scratched")] } });
  expect(await stoneOf(ctx, bench.stoneCode)).toMatchObject({ examinationState: "received", observationCount: 0 });
});

test("a reading keeps the check that its instrument had passed, and warns when the next one is overdue", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, corundum.refractometer));
  expect(await listReadings(ctx, bench)).toMatchObject([{ check: { referenceMaterial: "quartz" } }]);
  const { warnings } = await recordReading(later(ctx, 10 * 86_400_000), aReading(bench, corundum.refractometer));
  expect(warnings).toEqual([expect.stringContaining("was due on 8 December 2026")]);
});

test("an edge beside the contact liquid's own is kept with a warning, one above it is refused", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const { warnings } = await recordReading(ctx, aReading(bench, { ...corundum.refractometer, edges: "one", low: "1.805", high: "" }));
  expect(warnings).toEqual([expect.stringContaining("contact liquid's own edge")]);
  await expect(recordReading(ctx, aReading(bench, { ...corundum.refractometer, edges: "one", low: "1.85", high: "" }))).rejects.toMatchObject({ fieldErrors: { low: [expect.stringContaining("record it as over the limit")] } });
});

test("a stone that weighs something else is kept with a question", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const { warnings } = await recordReading(ctx, aReading(bench, { ...corundum.weight, weightCt: "2.310" }));
  expect(warnings).toEqual([expect.stringContaining("Is it the same stone?")]);
});

test("who may not record readings is refused, and the desk reads none", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, corundum.refractometer));
  for (const role of ["desk", "appraiser", "owner"] as const) await expect(recordReading(await aMember(ctx, [role]), aReading(bench, corundum.weight))).rejects.toMatchObject({ code: "forbidden" });
  const desk = await aMember(ctx, ["desk"]);
  await expect(listReadings(desk, bench)).rejects.toMatchObject({ code: "forbidden" });
  expect(await getBench(desk, bench)).toMatchObject({ stone: { code: bench.stoneCode }, readings: null, instruments: [] });
  expect(JSON.stringify(await getBench(desk, bench))).not.toContain("650000");
  expect(JSON.stringify(await getBench(ctx, bench))).not.toContain("650000");
});

test("another laboratory's stone is not there", async () => {
  const [ctx, theirs] = [await gemmologist(), await gemmologist()];
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, corundum.refractometer));
  await expect(recordReading(theirs, aReading(bench, corundum.free))).rejects.toMatchObject({ code: "not_found" });
  await expect(getBench(theirs, bench)).rejects.toMatchObject({ code: "not_found" });
  await expect(strikeReading(theirs, { ...bench, sequence: 1, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
  expect(await listReadings(theirs, bench)).toEqual([]);
});

test("a released stone takes no readings", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await ctx.db.update(stones).set({ goodsState: "released" }).where(eq(stones.id, bench.stoneId));
  await expect(recordReading(ctx, aReading(bench, corundum.weight))).rejects.toMatchObject({ code: "conflict" });
});

test("a struck reading stays legible in its place with who and why, and only one strike stands", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, { ...corundum.refractometer, edges: "one", low: "1.790", high: "" }));
  await recordReading(ctx, aReading(bench, corundum.refractometer));
  await strikeReading(ctx, { ...bench, sequence: 1, reason: "Contact liquid edge, stone not seated" });
  await expect(strikeReading(ctx, { ...bench, sequence: 1, reason: "again" })).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("struck already") });
  expect(await listReadings(ctx, bench)).toMatchObject([
    { sequence: 1, strike: { reason: "Contact liquid edge, stone not seated", by: ctx.person.name }, values: [{ typedText: "1.790" }] },
    { sequence: 2, strike: null },
  ]);
});

test("only the examiner and the observer strike a reading, and only while the stone is on the bench", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const colleague = await aMember(ctx, ["gemmologist"]);
  await recordReading(ctx, aReading(bench, corundum.refractometer));
  await recordReading(colleague, aReading(bench, corundum.weight));
  await expect(strikeReading(colleague, { ...bench, sequence: 1, reason: "mine is better" })).rejects.toMatchObject({ code: "forbidden" });
  await strikeReading(colleague, { ...bench, sequence: 2, reason: "Draught" });
  await ctx.db.update(stones).set({ examinationState: "checked" }).where(eq(stones.id, bench.stoneId));
  await expect(strikeReading(ctx, { ...bench, sequence: 1, reason: "late" })).rejects.toMatchObject({ code: "conflict" });
  await expect(recordReading(ctx, aReading(bench, corundum.weight))).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("Checked") });
});

test("a reading and its numbers are written together or not at all", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await expect(recordReading(ctx, aReading(bench, { ...corundum.refractometer, low: "1.770", high: "1.762" }))).rejects.toMatchObject({ code: "invalid_input" });
  expect(await ctx.db.select().from(observations).where(eq(observations.laboratoryId, ctx.laboratoryId))).toEqual([]);
  expect(await ctx.db.select().from(observationValues).where(eq(observationValues.laboratoryId, ctx.laboratoryId))).toEqual([]);
});
