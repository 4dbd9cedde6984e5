import { expect, test } from "vitest";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { observedAt } from "#app/features/readings/observed-at.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { readingsAsOf } from "#app/features/identification/readings-as-of.ts";
import { planFromSearch, planLeft, planSearch } from "#app/features/readings/reading-plan.ts";
import { weighingNotes } from "#app/features/readings/weighing-notes.ts";
import { composeReading } from "#app/features/readings/compose-reading.ts";
import type { Id } from "#app/domain/ids.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aLab, later } from "../../setup/factories.ts";

const gemmologist = () => aLab({ roles: ["owner", "gemmologist", "desk"] });

test("a reading that waited on a device keeps both clocks", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const madeAt = new Date(ctx.now.getTime() - 3 * 60 * 60 * 1000);
  await recordReading(ctx, { ...aReading(bench, corundum.weight), madeAt });
  const readings = await listReadings(ctx, bench);
  expect(readings[0]).toMatchObject({ observedAt: madeAt, recordedAt: ctx.now });
  expect(presentReadings(readings, "UTC")[0]!.sentWhen).toMatch(/^\d\d:\d\d$/);
});

test("another reading under the id of one that is kept is refused, not taken for it", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const first = aReading(bench, corundum.weight);
  await recordReading(ctx, first);
  expect(await recordReading(ctx, first)).toMatchObject({ sequence: 1 });
  await expect(recordReading(ctx, { ...first, draft: { ...corundum.weight, weightCt: "2.150" } })).rejects.toMatchObject({ code: "conflict" });
  // A test told by words alone has no digits to tell it by.
  const seen = { ...aReading(bench, corundum.free), draft: { kind: "colourFilter", quality: "good", typed: { appearsAs: "red", light: "daylight" } } } as const;
  expect(await recordReading(ctx, seen)).toMatchObject({ sequence: 2 });
  expect(await recordReading(ctx, seen)).toMatchObject({ sequence: 2 });
  await expect(recordReading(ctx, { ...seen, draft: { ...seen.draft, typed: { appearsAs: "green", light: "daylight" } } })).rejects.toMatchObject({ code: "conflict" });
  await expect(recordReading(ctx, { ...aReading(bench, corundum.refractometer), requestId: first.requestId })).rejects.toMatchObject({ code: "conflict" });
});

test("a device's clock that cannot be right is refused, one that is a little fast is not", () => {
  const now = new Date("2026-12-01T12:00:00Z");
  const after = (ms: number) => new Date(now.getTime() + ms);
  expect(observedAt({ madeAt: null, now })).toBe(now);
  expect(observedAt({ madeAt: after(60_000), now })).toBe(now);
  expect(() => observedAt({ madeAt: after(10 * 60_000), now })).toThrow(/clock of this device/);
  expect(() => observedAt({ madeAt: after(-30 * 86_400_000), now })).toThrow(/clock of this device/);
});

test("a strike that waited names its reading by the form that made it, and is made once", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  const reading = aReading(bench, corundum.weight);
  await recordReading(ctx, reading);
  const strike = { stoneCode: bench.stoneCode, requestId: reading.requestId, reason: "the stone was wet" };
  await strikeReading(ctx, strike);
  await strikeReading(ctx, strike);
  await expect(strikeReading(ctx, { ...strike, reason: "another" })).rejects.toMatchObject({ code: "conflict" });
  await expect(strikeReading(ctx, { ...strike, requestId: newRequestId() as Id<"observation"> })).rejects.toMatchObject({ code: "not_found" });
  expect(await listReadings(ctx, bench)).toMatchObject([{ strike: { reason: "the stone was wet" } }]);
});

test("readings as they stood: later ones gone, later strikes undone, struck ones counted if asked", async () => {
  const ctx = await gemmologist();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, corundum.weight));
  await recordReading(later(ctx, 60), aReading(bench, corundum.polariscope));
  await strikeReading(later(ctx, 120), { stoneCode: bench.stoneCode, sequence: 1, reason: "wet" });
  await recordReading(later(ctx, 180), aReading(bench, corundum.refractometer));
  const readings = await listReadings(ctx, bench);
  const shape = (view: Parameters<typeof readingsAsOf>[1]) => readingsAsOf(readings, view).map(({ sequence, strike }) => [sequence, strike !== null]);
  expect(shape({ atSequence: null, areStruckCounted: false })).toEqual([[1, true], [2, false], [3, false]]);
  expect(shape({ atSequence: 2, areStruckCounted: false })).toEqual([[1, false], [2, false]]);
  expect(shape({ atSequence: 3, areStruckCounted: false })).toEqual([[1, true], [2, false], [3, false]]);
  expect(shape({ atSequence: null, areStruckCounted: true })).toEqual([[1, false], [2, false], [3, false]]);
});

test("a plan is kept until its tests are recorded by the observer; one that gave no reading counts, one that was struck does not", () => {
  const plan = planFromSearch(new URLSearchParams("plan=polariscope&plan=density&plan=nonsense&since=3"));
  expect(plan).toEqual({ kinds: ["density", "polariscope"], sinceSequence: 3 });
  const made = (sequence: number, kind: "density" | "polariscope", more: object = {}) => ({ sequence, detail: { kind }, isOwn: true, strike: null, ...more });
  expect(planLeft(plan, [made(2, "density"), made(4, "density", { isOwn: false }), made(5, "density", { strike: {} })])).toEqual(["density", "polariscope"]);
  expect(planLeft(plan, [made(4, "density"), made(5, "polariscope")])).toEqual([]);
  expect(planFromSearch(new URLSearchParams(planSearch(plan).slice(1)))).toEqual(plan);
});

const balance = { resolution: 0.001, standardUncertainty: null, upperLimit: null, prismIndex: null };
const weigh = (again: object) => composeReading({ ...corundum.density, again }, balance);

test("three weighings give their mean, their spread and whether they climb", () => {
  const steady = weigh({ massAirCt2: "2.143", massAirCt3: "2.142", massLiquidCt2: "1.609", massLiquidCt3: "1.608" }).reading!;
  const single = weigh({}).reading!;
  const sg = (reading: typeof single) => reading.values.find(({ name }) => name === "sg")!;
  expect(sg(steady).value).not.toBe(sg(single).value);
  expect(sg(steady).value).toBeCloseTo(sg(single).value, 1);
  expect(weighingNotes(steady)).toEqual({ spread: "3 in air, spread 0.001 ct; 3 in water, spread 0.001 ct", drift: null });
  expect(weighingNotes(single)).toBeNull();
  expect(weighingNotes(weigh({ massLiquidCt2: "1.611", massLiquidCt3: "1.615" }).reading!)!.drift).toMatch(/climbs by 0\.007 ct/);
  expect(weighingNotes(weigh({ massLiquidCt2: "1.604", massLiquidCt3: "1.600" }).reading!)!.drift).toMatch(/falls by 0\.008 ct/);
});

test.each([
  ["far from the first", { massLiquidCt2: "1.906" }, "massLiquidCt2", /far from the first/],
  ["words", { massAirCt3: "heavy" }, "massAirCt3", /in digits/],
])("a second weighing %s is refused beside its field", (_, again, field, message) => {
  expect(weigh(again).problems?.[field]?.[0]).toMatch(message);
});
