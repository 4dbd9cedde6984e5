import type { ConsentCode } from "#app/domain/consent-code.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import type { ObservationKind } from "#app/domain/reading.ts";
import type { BenchTestId } from "#app/gemmology/next-test/bench-test.ts";
import { nextTests, type NextTest, type Vetoed } from "#app/gemmology/next-test/next-tests.ts";
import { rankSpecies, type RankOptions } from "#app/gemmology/ranking/rank-species.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";
import { evidenceFromReadings } from "#app/features/readings/evidence-from-readings.ts";
import { waterWeighingUncertaintyCt, weighingUncertaintyCt } from "#app/features/readings/usual-uncertainty.ts";
import type { BenchInstrument } from "#app/features/stones/get-bench.server.ts";
import type { NumberedReading } from "./rank-readings.ts";

type StoneToTest = Readonly<{ weightText: string; isMounted: boolean; mount: string; consents: readonly ConsentCode[]; instruments: readonly BenchInstrument[] }>;
/** What the bench shows of it: the form that records a test is named beside it. */
export type NextTests = Readonly<{ recommended: ReadonlyArray<NextTest & { kind: ObservationKind }>; vetoed: readonly Vetoed[] }>;

/** The tests that the bench has a form for. */
const kindOf: Partial<Record<BenchTestId, ObservationKind>> = { edges: "refractometer", spot: "spot", polariscope: "polariscope", figure: "polariscope", density: "density", dichroscope: "dichroscope", longWave: "ultraviolet", shortWave: "ultraviolet", colourFilter: "colourFilter", thermalProbe: "thermalProbe", spectroscope: "spectroscope", magnet: "magnet", brewster: "brewster", depth: "realDepth", polariser: "rotation", secondFacet: "rotation" };
const mostShown = 3;

/** What to test next, from the readings that stand, this stone's weight, its consents and the instruments at hand. */
export function nextTestsForStone(readings: readonly NumberedReading[], table: SpeciesTable, stone: StoneToTest, options: RankOptions = {}): NextTests {
  const evidence = evidenceFromReadings(readings);
  if (Object.keys(evidence).length === 0) return { recommended: [], vetoed: [] };
  const { done, poor } = testsMade(readings);
  const rotations = evidence.ri?.filter((reading) => reading.kind === "rotation") ?? [];
  const balance = stone.instruments.find(({ kind }) => kind === "balance") ?? null;
  const { recommended, vetoed } = nextTests(rankSpecies(evidence, table, options).candidates, table, {
    massCt: stone.isMounted ? null : (parseDecimal(stone.weightText) ?? null),
    uAirCt: weighingUncertaintyCt(balance),
    uWaterCt: waterWeighingUncertaintyCt(balance),
    isPolished: true,
    // Of two runs each may decide for the other: the ranking takes them together.
    undecided: rotations.length === 1 ? rotations[0]!.solutions : [],
    isOverLimit: evidence.ri?.some(({ kind }) => kind === "overLimit") ?? false,
    offered: new Set(Object.keys(kindOf) as BenchTestId[]),
    done,
    poor,
    barred: barredTests(stone),
  });
  return { recommended: recommended.slice(0, mostShown).map((test) => ({ ...test, kind: kindOf[test.testId]! })), vetoed };
}

function testsMade(readings: readonly NumberedReading[]): { done: Set<BenchTestId>; poor: Set<BenchTestId> } {
  const done = new Set<BenchTestId>();
  const poor = new Set<BenchTestId>();
  for (const { detail, quality, strike } of readings as ReadonlyArray<NumberedReading & { strike?: unknown }>) {
    if (strike || quality === "noResult") continue;
    const to = quality === "good" ? done : poor;
    if (detail.kind === "refractometer" && (detail.isRotated || detail.edges === "one")) to.add("edges").add("spot");
    if (detail.kind === "criticalAngle" || detail.kind === "overLimit") to.add("edges").add("spot");
    if (detail.kind === "spot") to.add("spot");
    if (detail.kind === "polariscope") to.add("polariscope");
    if (detail.kind === "polariscope" && detail.figure !== "notSought") to.add("figure");
    if (detail.kind === "density") to.add("density");
    if (detail.kind === "rotation") to.add("edges").add("spot");
    if (detail.kind === "ultraviolet") to.add(detail.wave === "shortWave" ? "shortWave" : "longWave");
    if (detail.kind === "realDepth") to.add("depth");
    if (detail.kind === "spectroscope" || detail.kind === "magnet" || detail.kind === "brewster" || detail.kind === "dichroscope" || detail.kind === "colourFilter" || detail.kind === "thermalProbe") to.add(detail.kind);
  }
  return { done, poor };
}

function barredTests({ consents, instruments, isMounted, mount }: StoneToTest): Map<BenchTestId, string> {
  const barred = new Map<BenchTestId, string>();
  const bar = (tests: readonly BenchTestId[], because: string | undefined) => {
    if (because) for (const test of tests) if (!barred.has(test)) barred.set(test, because);
  };
  bar(["edges", "spot", "polariser", "secondFacet"], consents.includes("contactLiquid") ? undefined : "the client has not agreed to a contact liquid");
  bar(["density"], isMounted || mount === "strung" ? "the mount would be weighed with it" : undefined);
  bar(["density"], consents.includes("hydrostatic") ? undefined : "the client has not agreed to weighing in water");
  const missing = (kind: BenchInstrument["kind"], name: string) => {
    const fitting = instruments.filter((instrument) => instrument.kind === kind);
    if (fitting.length === 0) return `no ${name} is in service`;
    return fitting.every(({ isOutOfCheck }) => isOutOfCheck) ? `the check of every ${name} is overdue` : undefined;
  };
  bar(["edges", "spot", "polariser", "secondFacet"], missing("refractometer", "refractometer"));
  bar(["polariscope", "figure"], missing("polariscope", "polariscope"));
  bar(["density"], missing("balance", "balance"));
  bar(["longWave", "shortWave"], consents.includes("ultraviolet") ? undefined : "the client has not agreed to ultraviolet light");
  bar(["thermalProbe"], consents.includes("thermalProbe") ? undefined : "the client has not agreed to the thermal probe");
  bar(["dichroscope"], missing("dichroscope", "dichroscope"));
  bar(["spectroscope"], missing("spectroscope", "spectroscope"));
  bar(["magnet"], isMounted ? "the mount’s metal would answer the magnet" : missing("magnet", "magnet"));
  bar(["brewster"], missing("brewsterMeter", "Brewster-angle meter"));
  bar(["depth"], missing("microscope", "microscope with a focus scale"));
  bar(["longWave", "shortWave"], missing("uvLamp", "ultraviolet lamp"));
  bar(["thermalProbe"], missing("thermalProbe", "thermal probe"));
  return barred;
}
