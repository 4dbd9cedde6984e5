import { expect, test } from "vitest";
import { composeReading, type QuickDraft } from "#app/features/readings/compose-reading.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { evidenceFromReadings, type RankedReading } from "#app/features/readings/evidence-from-readings.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { contradictingReadings, rankReadings } from "#app/features/identification/rank-readings.ts";
import { rankStone } from "#app/features/identification/rank-stone.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { aBench, aForm, aReading, corundum } from "../../setup/bench-factory.ts";
import { aLab } from "../../setup/factories.ts";

const instrument: ReadingInstrument = { resolution: 0.001, standardUncertainty: null, upperLimit: 1.81, prismIndex: 1.88 };
const composed = (draft: QuickDraft): RankedReading => composeReading(draft, instrument).reading!;
const { table } = loadSpeciesTable();

test("the ranking while typing is the ranking after saving", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  await recordReading(ctx, aReading(bench, corundum.polariscope));
  const saved = await listReadings(ctx, bench);
  const form = aForm({ kind: "refractometer", quality: "good", low: "1,762", high: "1.770", isRotated: "on", facet: "table", light: "sodium" });
  const typed = composeReading(readingDraftFromForm(form) as QuickDraft, instrument).reading!;
  const inBrowser = rankReadings([...saved, { ...typed, sequence: null }], table);
  await recordReading(ctx, aReading(bench, { ...corundum.refractometer, low: "1,762" }));
  const onServer = (await rankStone(ctx, bench)).bench;
  expect(onServer.candidates).toEqual(inBrowser.candidates);
  expect(onServer.unlisted).toBe(inBrowser.unlisted);
  expect(onServer.candidates[0]).toMatchObject({ speciesId: "corundum" });
});

test("readings of a corundum become the evidence of one, as the interface takes it", () => {
  const evidence = evidenceFromReadings([corundum.refractometer, corundum.polariscope, corundum.density, corundum.weight, corundum.free].map(composed));
  expect(evidence).toMatchObject({ ri: [{ kind: "edges", low: 1.762, high: 1.77, u: 0.0015, rotated: true }], opticCharacter: "uniaxial", sg: { value: expect.closeTo(3.996, 2) } });
  expect(evidence).not.toHaveProperty("opticSign");
  expect(parseEvidence(evidence)).toMatchObject({ ok: true });
});

test.each<[string, QuickDraft, object]>([
  ["one edge", { ...corundum.refractometer, edges: "one", low: "1.718", high: "" }, { ri: [{ kind: "single", n: 1.718, u: 0.0015 }] }],
  ["two edges at one position", { ...corundum.refractometer, isRotated: false }, { ri: [{ kind: "edges", low: 1.762, high: 1.77, u: 0.0015, rotated: false }] }],
  ["a spot", { kind: "spot", quality: "good", method: "50/50", n: "1.54", facet: "dome", light: "white" }, { ri: [{ kind: "spot", n: 1.54, u: 0.006 }] }],
  ["over the limit", { kind: "overLimit", quality: "good", limit: "1.81", facet: "table", light: "sodium" }, { ri: [{ kind: "overLimit", limit: 1.81 }] }],
  ["a critical angle", { kind: "criticalAngle", quality: "good", angleDeg: "55.23", prismN: "1.88", facet: "table", light: "sodium" }, { ri: [{ kind: "criticalAngle", angleDeg: 55.23, prismN: 1.88, u: 0.03 }] }],
  ["dark throughout", { ...corundum.polariscope, behaviour: "dark", figure: "notSought" }, { opticCharacter: "isotropic" }],
  ["a figure with its sign", { ...corundum.polariscope, sign: "-" }, { opticCharacter: "uniaxial", opticSign: "-" }],
  ["nothing that can be told", { ...corundum.polariscope, behaviour: "cannotTell", figure: "notSought" }, {}],
  ["a weight", corundum.weight, {}],
])("%s is taken for what it is", (_, draft, expected) => {
  expect(evidenceFromReadings([composed(draft)])).toEqual(expected);
});

test("a struck reading and one without result say nothing", () => {
  const reading = composed(corundum.refractometer);
  expect(evidenceFromReadings([{ ...reading, strike: { reason: "x" } }, { ...reading, quality: "noResult", values: [] }])).toEqual({});
});

test("a poor reading counts with a wider uncertainty", () => {
  const [good, poor] = (["good", "poor"] as const).map((quality) => evidenceFromReadings([composed({ ...corundum.density, quality })]).sg!.u!);
  expect(poor).toBeCloseTo(3 * good!, 6);
});

test("the better look through the polariscope stands, then the one that says more, whatever the order", () => {
  const [fair, good, figure] = [{ ...corundum.polariscope, quality: "fair", behaviour: "dark", figure: "notSought" }, { ...corundum.polariscope, figure: "none" }, corundum.polariscope].map((draft) => composed(draft as QuickDraft));
  for (const readings of [[fair!, good!, figure!], [figure!, good!, fair!]]) expect(evidenceFromReadings(readings).opticCharacter).toBe("uniaxial");
  expect(evidenceFromReadings([good!, fair!]).opticCharacter).toBe("anisotropic");
});

test("weighings that agree sharpen the density, weighings that do not widen it", () => {
  const sg = (...masses: string[]) => evidenceFromReadings(masses.map((massLiquidCt) => composed({ ...corundum.density, massLiquidCt }))).sg!;
  expect(sg("1.608", "1.608").u).toBeLessThan(sg("1.608").u!);
  expect(sg("1.608", "1.560").u).toBeGreaterThan(sg("1.608").u!);
});

test("a species is ruled out by the reading that rules it out", () => {
  const readings = [{ ...composed(corundum.free), sequence: 1 }, { ...composed(corundum.refractometer), sequence: 2 }, { ...composed(corundum.density), sequence: 3 }];
  const against = contradictingReadings(readings, table);
  expect(against.get("quartz")!.map(({ sequence }) => sequence)).toEqual([2, 3]);
  expect(against.has("corundum")).toBe(false);
  const ranking = rankReadings(readings, table);
  const quartz = ranking.ruledOut.find(({ speciesId }) => speciesId === "quartz")!;
  expect(quartz).toMatchObject({ name: "Quartz", because: expect.stringMatching(/too low|too high/) });
  expect(ranking.candidates.length + ranking.otherCount + ranking.ruledOutCount).toBe(table.nodes.length);
});

test("lanes of a candidate carry the species' range, what was measured and its uncertainty", () => {
  const lanes = rankReadings([{ ...composed(corundum.refractometer), sequence: 1 }, { ...composed(corundum.density), sequence: 2 }], table).candidates[0]!.lanes;
  expect(lanes.map(({ property }) => property)).toEqual(["ri", "birefringence", "sg"]);
  expect(lanes[0]!.scale).toMatchObject({ observedLow: 1.762, observedHigh: 1.77, u: 0.0015 });
  expect(lanes[1]!.scale).toMatchObject({ observedLow: 0.008, u: expect.closeTo(0.0012, 5) });
  for (const { scale } of lanes) expect(scale!.referenceLow).toBeLessThanOrEqual(scale!.referenceHigh);
});

test("no readings rank nothing", () => {
  expect(rankReadings([], table)).toMatchObject({ hasEvidence: false, ruledOutCount: 0, index: null, density: null });
});

test("a poor reading goes to the ranking as one: it strains what it does not fit, and contradicts nothing", () => {
  const poor = composed({ ...corundum.density, quality: "poor" });
  expect(evidenceFromReadings([poor]).sg).toMatchObject({ quality: "poor" });
  expect(evidenceFromReadings([poor, composed(corundum.density)]).sg).not.toHaveProperty("quality");
  expect(evidenceFromReadings([composed({ ...corundum.refractometer, quality: "fair" })]).ri).toEqual([expect.objectContaining({ kind: "edges", quality: "fair" })]);
  expect(contradictingReadings([{ ...poor, sequence: 1 }], table).size).toBe(0);
});
