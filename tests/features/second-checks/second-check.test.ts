import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { conclusions, observations, secondChecks, stoneEvents, stones } from "#app/db/schema/index.ts";
import { getConclusion } from "#app/features/identification/get-conclusion.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { compareSecondCheck } from "#app/features/second-checks/compare-second-check.server.ts";
import { compareReadings } from "#app/features/second-checks/compare-readings.ts";
import { decideSecondCheck } from "#app/features/second-checks/decide-second-check.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { aConcludedStone, aConclusion } from "../../setup/conclusion-factory.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aLab, aMember, later } from "../../setup/factories.ts";

const requestId = () => newId<"secondCheck">();
const found = { ownSpecies: "Corundum", ownNature: "synthetic" } as const;
const hourMs = 3_600_000;

async function aCheck() {
  const ctx = await aLab({ roles: ["owner", "gemmologist", "desk"] });
  const bench = await aConcludedStone(ctx);
  const checker = await aMember(ctx, ["gemmologist"]);
  await startSecondCheck(checker, { ...bench, requestId: requestId() });
  const read = (draft: Parameters<typeof aReading>[1]) => recordReading(checker, aReading(bench, draft, { isForSecondCheck: true }));
  return { ctx, bench, checker, read };
}

test("a checker sees none of the first readings and no conclusion until they compare", async () => {
  const { ctx, bench, checker, read } = await aCheck();
  expect(await listReadings(checker, bench)).toEqual([]);
  await expect(getConclusion(checker, bench)).rejects.toMatchObject({ code: "forbidden" });
  const blind = await getBench(checker, bench);
  expect(blind).toMatchObject({ isCheckerBlind: true, readings: [], conclusion: { found: null }, stone: { weightText: "" } });
  expect(JSON.stringify(blind)).not.toMatch(/1\.762|Curved striae|orundum|synthetic/);
  await read(corundum.refractometer);
  await read(corundum.density);
  expect((await listReadings(checker, bench)).map(({ isOwn, isOfSecondCheck, isBlind }) => [isOwn, isOfSecondCheck, isBlind])).toEqual([[true, true, true], [true, true, true]]);
  // Nor do the others see the check's.
  expect((await listReadings(ctx, bench)).some(({ isOfSecondCheck }) => isOfSecondCheck)).toBe(false);
  await compareSecondCheck(checker, { ...bench, ...found });
  expect((await listReadings(checker, bench)).length).toBeGreaterThan(2);
  expect((await listReadings(ctx, bench)).filter(({ isOfSecondCheck }) => isOfSecondCheck)).toHaveLength(2);
  expect(await getConclusion(checker, bench)).toMatchObject({ speciesName: "Corundum" });
});

test("the check is somebody else's: not the examiner's, nor of anyone who read the stone", async () => {
  const ctx = await aLab({ roles: ["owner", "gemmologist", "desk"] });
  const helper = await aMember(ctx, ["gemmologist"]);
  const bench = await aConcludedStone(ctx, { alsoReadBy: helper });
  for (const person of [ctx, helper]) await expect(startSecondCheck(person, { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "forbidden", userMessage: expect.stringContaining("somebody else's") });
  for (const role of ["owner", "appraiser", "desk"] as const) await expect(startSecondCheck(await aMember(ctx, [role]), { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "forbidden" });
});

test("a sole practitioner's own look again is a delayed self-check, never a second check", async () => {
  const ctx = await aLab({ isSolePractice: true });
  const bench = await aConcludedStone(ctx);
  await expect(startSecondCheck(later(ctx, 23 * hourMs), { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("at least 24 hours") });
  await startSecondCheck(later(ctx, 24 * hourMs), { ...bench, requestId: requestId() });
  expect(await ctx.db.select().from(secondChecks).where(eq(secondChecks.stoneId, bench.stoneId))).toMatchObject([{ kind: "selfCheck", checkerId: ctx.actorId }]);
  expect(await listReadings(ctx, bench)).toEqual([]);
});

test("one check a conclusion, begun once however often it is sent", async () => {
  const ctx = await aLab({ roles: ["owner", "gemmologist", "desk"] });
  const bench = await aConcludedStone(ctx);
  const [first, second] = [await aMember(ctx, ["gemmologist"]), await aMember(ctx, ["gemmologist"])];
  const once = { ...bench, requestId: requestId() };
  await Promise.all([startSecondCheck(first, once), startSecondCheck(first, once)]);
  await startSecondCheck(first, { ...bench, requestId: requestId() });
  await expect(startSecondCheck(second, { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "conflict" });
  expect(await ctx.db.select().from(secondChecks).where(eq(secondChecks.stoneId, bench.stoneId))).toHaveLength(1);
});

test("comparing waits for an optical reading and one of another test, and happens once", async () => {
  const { bench, checker, read } = await aCheck();
  await expect(compareSecondCheck(checker, { ...bench, ...found })).rejects.toMatchObject({ userMessage: expect.stringContaining("optical reading") });
  await read(corundum.weight);
  await expect(compareSecondCheck(checker, { ...bench, ...found })).rejects.toMatchObject({ userMessage: expect.stringContaining("optical reading") });
  const { sequence } = await read(corundum.refractometer);
  await strikeReading(checker, { ...bench, sequence, reason: "liquid edge" });
  await expect(compareSecondCheck(checker, { ...bench, ...found })).rejects.toMatchObject({ userMessage: expect.stringContaining("optical reading") });
  await read(corundum.refractometer);
  await compareSecondCheck(checker, { ...bench, ...found });
  await expect(compareSecondCheck(checker, { ...bench, ...found })).rejects.toMatchObject({ code: "not_found" });
  await expect(read(corundum.density)).rejects.toMatchObject({ code: "conflict" });
  await expect(strikeReading(checker, { ...bench, sequence: sequence + 1, reason: "late" })).rejects.toMatchObject({ code: "conflict" });
});

test("a checker cannot strike a first reading, which is not there for them", async () => {
  const { bench, checker } = await aCheck();
  await expect(strikeReading(checker, { ...bench, sequence: 1, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
});

test("agreeing moves the stone on, returning sends it back with a reason, either once", async () => {
  const one = await aCheck();
  for (const draft of [corundum.refractometer, corundum.density]) await one.read(draft);
  await expect(decideSecondCheck(one.checker, { ...one.bench, outcome: "agreed", reason: "" })).rejects.toMatchObject({ code: "conflict" });
  await compareSecondCheck(one.checker, { ...one.bench, ...found });
  await decideSecondCheck(one.checker, { ...one.bench, outcome: "agreed", reason: "" });
  await expect(decideSecondCheck(one.checker, { ...one.bench, outcome: "returned", reason: "no" })).rejects.toMatchObject({ code: "conflict" });
  expect(await one.ctx.db.select().from(stones).where(eq(stones.id, one.bench.stoneId))).toMatchObject([{ examinationState: "checked" }]);

  const two = await aCheck();
  for (const draft of [corundum.refractometer, corundum.density]) await two.read(draft);
  await compareSecondCheck(two.checker, { ...two.bench, ...found });
  await expect(decideSecondCheck(two.checker, { ...two.bench, outcome: "returned", reason: " " })).rejects.toMatchObject({ fieldErrors: { reason: [expect.stringContaining("why the stone goes back")] } });
  await decideSecondCheck(two.checker, { ...two.bench, outcome: "returned", reason: "No curved striae seen" });
  expect(await two.ctx.db.select().from(stones).where(eq(stones.id, two.bench.stoneId))).toMatchObject([{ examinationState: "returned" }]);
  // The next reading takes the examination up again; the check's readings stay out of it.
  await recordReading(two.ctx, aReading(two.bench, corundum.refractometer));
  const states = (await two.ctx.db.select().from(stoneEvents).where(eq(stoneEvents.stoneId, two.bench.stoneId))).filter(({ machine }) => machine === "examination").map(({ toState }) => toState);
  expect(states).toEqual(["received", "examining", "concluded", "returned", "examining"].slice(states[0] === "received" ? 0 : 1));
});

test("another laboratory's stone has no check to begin, compare or decide", async () => {
  const { bench } = await aCheck();
  const theirs = await aLab();
  await expect(startSecondCheck(theirs, { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "not_found" });
  await expect(compareSecondCheck(theirs, { ...bench, ...found })).rejects.toMatchObject({ code: "not_found" });
  await expect(decideSecondCheck(theirs, { ...bench, outcome: "agreed", reason: "" })).rejects.toMatchObject({ code: "not_found" });
  expect(await getConclusion(theirs, bench)).toBeNull();
});

test("two people's readings compare within what the house allows", async () => {
  const { bench, checker, read } = await aCheck();
  await read({ ...corundum.refractometer, low: "1.765", high: "1.775" });
  await read({ ...corundum.weight, weightCt: "2.153" });
  await compareSecondCheck(checker, { ...bench, ...found });
  const readings = await listReadings(checker, bench);
  const rows = compareReadings(readings.filter((one) => !one.isOfSecondCheck), readings.filter((one) => one.isOfSecondCheck));
  expect(rows.map(({ what, difference, isWithin }) => [what, difference, isWithin])).toEqual([
    ["Low index", "+0.0030", true],
    ["High index", "+0.0050", false],
    ["Weight", "+0.0100", true],
  ]);
});

test("a stone that is not concluded has nothing to check", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  await expect(startSecondCheck(await aMember(ctx, ["gemmologist"]), { ...bench, requestId: requestId() })).rejects.toMatchObject({ code: "conflict" });
});

test("a revised conclusion is the next version, with a check of its own", async () => {
  const { ctx, bench, checker, read } = await aCheck();
  for (const draft of [corundum.refractometer, corundum.density]) await read(draft);
  await compareSecondCheck(checker, { ...bench, ...found });
  await decideSecondCheck(checker, { ...bench, outcome: "returned", reason: "Look at the striae again" });
  await proposeConclusion(ctx, await aConclusion(ctx, bench));
  expect((await ctx.db.select().from(conclusions).where(eq(conclusions.stoneId, bench.stoneId))).map(({ version }) => version).sort()).toEqual([1, 2]);
  await startSecondCheck(await aMember(ctx, ["gemmologist"]), { ...bench, requestId: requestId() });
  expect((await ctx.db.select().from(observations).where(eq(observations.stoneId, bench.stoneId))).filter(({ secondCheckId }) => secondCheckId).length).toBe(2);
});
