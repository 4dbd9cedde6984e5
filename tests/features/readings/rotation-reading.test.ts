import { expect, test } from "vitest";
import fc from "fast-check";
import { impliedIndex } from "#app/domain/implied-index.ts";
import { rowsText, tablesOf } from "#app/components/bench/rotation-table-state.ts";
import { composeRotation } from "#app/features/readings/compose-rotation.ts";
import { evidenceFromReadings } from "#app/features/readings/evidence-from-readings.ts";
import { readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";
import { readRotationRows } from "#app/features/readings/rotation-rows.ts";
import { edgesOfSolution } from "#app/gemmology/rotation/edges-of-solution.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { aFacet, onFacet, randomFrom } from "../../gemmology/rotation/a-rotation-run.ts";
import type { PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";

const instrument = { resolution: 0.001, standardUncertainty: 0.0005, upperLimit: 1.81, prismIndex: null };
const lines = (indices: PrincipalIndices, normal: readonly [number, number, number], label = "table") =>
  [`${label}:`, ...aFacet(indices, onFacet(normal), { label }).readings.map(({ angleDeg, lower, upper }) => `${angleDeg} ${lower!.toFixed(4)} ${upper!.toFixed(4)}`)].join("\n");
const compose = (rows: string) => composeRotation({ kind: "rotation", quality: "good", light: "sodium", rows }, instrument);
const value = (reading: ReturnType<typeof compose>["reading"], name: string) => reading!.values.find((one) => one.name === name);

test("a uniaxial run is decided, and its indices are those of the crystal", () => {
  const { reading } = compose(lines([1.7689, 1.7689, 1.7604], [0.9, 0.3, 0.3]));
  expect(reading!.detail).toMatchObject({ kind: "rotation", character: "uniaxial", sign: "-" });
  expect(value(reading, "omega")!.value).toBeCloseTo(1.7689, 3);
  expect(value(reading, "epsilon")!.value).toBeCloseTo(1.7604, 3);
  expect(readingValueText(reading!)).toBe("nω 1.7689 ± 0.0012, nε 1.7604 ± 0.0012");
  expect(evidenceFromReadings([reading!])).toMatchObject({ ri: [{ kind: "rotation", solutions: [{ indices: { omega: expect.closeTo(1.7689, 3), epsilon: expect.closeTo(1.7604, 3) } }] }] });
});

test("one facet of a biaxial crystal leaves the middle index open, and says so; both ends are evidence", () => {
  const { reading } = compose(lines([1.654, 1.671, 1.69], [0.5, 0.6, 0.62]));
  expect(reading!.detail).toMatchObject({ character: "biaxial" });
  expect(value(reading, "beta")).toBeUndefined();
  expect(value(reading, "low")!.value).toBeCloseTo(1.654, 3);
  expect(value(reading, "high")!.value).toBeCloseTo(1.69, 3);
  expect(readingValueText(reading!)).toMatch(/ to /);
  // Both crystals go to the ranking, alike.
  const [run] = evidenceFromReadings([reading!]).ri!;
  const betas = run!.kind === "rotation" ? run!.solutions.flatMap(({ indices, weight }) => ("beta" in indices ? [[indices.beta, weight]] : [])) : [];
  expect(betas).toHaveLength(2);
  expect(betas.some(([beta]) => Math.abs(beta! - 1.671) < 0.001)).toBe(true);
  expect(readingSeenText(reading!)).toMatch(/biaxial.*; 12 positions$/);
});

test("a second facet decides it", () => {
  const { reading } = compose(`${lines([1.654, 1.671, 1.69], [0.5, 0.6, 0.62])}\n${lines([1.654, 1.671, 1.69], [0.1, 0.2, 0.95], "pavilion")}`);
  expect(value(reading, "beta")!.value).toBeCloseTo(1.671, 2);
  expect(readingSeenText(reading!)).toMatch(/24 positions on 2 facets/);
});

test.each<[string, string, RegExp]>([
  ["nothing", "", /needs at least three positions; there is none yet/],
  ["two positions", "0 1.65 1.67\n15 1.65 1.67", /so far there are two/],
  ["a position without edges", "0 - -\n15 1.65 1.67\n30 1.65 1.67", /^Line 1: at least one edge/],
  ["words for an edge", "0 1.65 wide\n15 1.65 1.67\n30 1.65 1.67", /^Line 1: “wide” is no edge/],
  ["an edge of 3", "0 1.65 3.0\n15 1.65 1.67\n30 1.65 1.67", /between 1\.3 and 2\.1/],
  ["an angle of a thousand", "1000 1.65 1.67\n15 1.65 1.67\n30 1.65 1.67", /is no angle/],
  ["five columns", "0 1.65 1.67 80 90\n", /^Line 1: write the angle/],
  ["a facet without positions", "table:\n0 1.65 1.67\n15 1.65 1.67\n30 1.65 1.67\npavilion:", /No position under “pavilion”/],
  ["an edge beyond the liquid", "0 1.65 1.83\n15 1.65 1.67\n30 1.65 1.67", /1\.830 at 0° lies above 1\.81/],
  ["ten thousand letters", "x".repeat(10_000), /At most 6000 characters/],
  ["a hundred and one positions", Array.from({ length: 101 }, (_, at) => `${at} 1.65 1.67`).join("\n"), /at most 100 positions/],
])("%s is refused with its line", (_, rows, message) => {
  expect(compose(rows).problems?.rows?.[0]).toMatch(message);
});

test("edges may be typed without the mark, exchanged, alone and as one; commas are decimal", () => {
  const { run } = readRotationRows("0 1670 1,655\n15 1.66 =\n30 1655 -\n45 - 1.68 75", 0.001);
  expect(run!.facets[0]).toMatchObject({ label: "table", readings: [{ lower: 1.655, upper: 1.67 }, { lower: 1.66, upper: 1.66 }, { lower: 1.655, upper: null }, { lower: null, upper: 1.68, polariserDeg: 75 }] });
  expect([impliedIndex("1762"), impliedIndex("17625"), impliedIndex("1.762"), impliedIndex("55"), impliedIndex("17")]).toEqual(["1.762", "1.7625", "1.762", "55", "17"]);
});

test("a table of positions reads back from the lines that it sends", () => {
  const row = fc.record({ angle: fc.integer({ min: 0, max: 360 }).map(String), first: fc.constantFrom("1.654", "1655", ""), second: fc.constantFrom("1.690", "1,69"), polariser: fc.constantFrom("", "80") });
  fc.assert(
    fc.property(fc.array(fc.record({ label: fc.constantFrom("table", "crown", "a small one"), rows: fc.array(row, { minLength: 1, maxLength: 13 }) }), { minLength: 1, maxLength: 6 }), (facets) => {
      expect(tablesOf(rowsText(facets))).toEqual(facets);
    }),
  );
});

test("what is drawn of a solution is what its crystal shows: its edges go through the readings that it was fitted to", () => {
  const { even, normal } = randomFrom(20261201);
  for (let at = 0; at < 60; at++) {
    const alpha = 1.5 + 0.2 * even();
    const beta = alpha + 0.01 + 0.05 * even();
    const indices: PrincipalIndices = at % 3 === 0 ? [beta, beta, alpha] : [alpha, beta, beta + 0.01 + 0.05 * even()];
    const facet = aFacet(indices, onFacet([normal(), normal(), normal()], [normal(), normal(), normal()]), { u: 0.0005 });
    const solution = fitRotation({ facets: [facet] }).solutions[0]!;
    const edges = edgesOfSolution(solution, "table")!;
    const off = facet.readings.map(({ angleDeg, upper, lower }) => Math.max(Math.abs(edges(angleDeg).upper - upper!), Math.abs(edges(angleDeg).lower - lower!)));
    expect(Math.max(...off), JSON.stringify(indices)).toBeLessThan(0.0006);
  }
});
