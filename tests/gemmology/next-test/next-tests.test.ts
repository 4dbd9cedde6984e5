import fc from "fast-check";
import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { benchTestIds, type BenchTestId } from "#app/gemmology/next-test/bench-test.ts";
import { expectedInformation } from "#app/gemmology/next-test/expected-information.ts";
import { nextTests, type Setting } from "#app/gemmology/next-test/next-tests.ts";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";

const { table } = loadSpeciesTable();
const setting = (more: Partial<Setting> = {}): Setting => ({ massCt: 3, uAirCt: 0.0015, uWaterCt: 0.004, isPolished: true, offered: new Set(benchTestIds), done: new Set(), poor: new Set(), barred: new Map(), ...more });
const after = (evidence: Evidence, more: Partial<Setting> = {}) => nextTests(rankSpecies(evidence, table).candidates, table, setting(more));

// Source: the project's formulas, §11: two species of density 3.02(2) and 3.18(3), even odds, computed there by an independent script.
test.each([[0.03, 0.92], [0.08, 0.455], [0.15, 0.176], [0.3, 0.049]])("a density to %s tells so many bits", (u, bits) => {
  const normal = (x: number, middle: number, sigma: number) => Math.exp(-0.5 * ((x - middle) / sigma) ** 2) / sigma;
  const grid = Array.from({ length: 4_000 }, (_, at) => 1 + at / 1_000);
  const rows = [[3.02, 0.02], [3.18, 0.03]].map(([middle, spread]) => grid.map((x) => normal(x, middle!, Math.hypot(u, spread!))));
  expect(expectedInformation([0.5, 0.5], rows)).toBeCloseTo(bits, 2);
});

test("information is never negative, never above the entropy, and nothing is learnt from what all show alike", () => {
  const likelihoods = fc.array(fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 4, maxLength: 4 }), { minLength: 3, maxLength: 3 });
  fc.assert(
    fc.property(fc.array(fc.double({ min: 0.01, max: 1, noNaN: true }), { minLength: 3, maxLength: 3 }), likelihoods, (weights, rows) => {
      const bits = expectedInformation(weights, rows);
      const total = weights.reduce((sum, weight) => sum + weight, 0);
      expect(bits).toBeGreaterThanOrEqual(0);
      expect(bits).toBeLessThanOrEqual(weights.reduce((sum, weight) => sum - (weight / total) * Math.log2(weight / total), 0) + 1e-9);
      expect(expectedInformation(weights, [rows[0]!, rows[0]!, rows[0]!])).toBeCloseTo(0, 9);
    }),
    { numRuns: 200, seed: 7 },
  );
  expect(() => expectedInformation([0, 0], [[1], [1]])).toThrow(RangeError);
});

test("between topaz and tourmaline a large stone is weighed, a small one is not", () => {
  const even = ["topaz", "tourmaline"].map((speciesId) => ({ speciesId, probability: 0.5 }));
  const bitsOf = (massCt: number) => nextTests(even, table, setting({ massCt })).recommended.find(({ testId }) => testId === "density")?.bits ?? 0;
  expect(bitsOf(5)).toBeGreaterThan(0.8);
  expect(bitsOf(0.1)).toBeLessThan(0.4);
  expect(nextTests(even, table, setting({ massCt: null })).recommended.map(({ testId }) => testId)).not.toContain("density");
});

test("what is done is not asked for again, and what is barred is told with its reason", () => {
  const evidence: Evidence = { sg: { value: 3.99, u: 0.03 } };
  const { recommended, vetoed } = after(evidence, { done: new Set<BenchTestId>(["density"]), barred: new Map<BenchTestId, string>([["edges", "the client has not agreed to a contact liquid"]]) });
  expect(recommended.map(({ testId }) => testId)).not.toContain("density");
  expect(recommended.map(({ testId }) => testId)).not.toContain("edges");
  expect(vetoed).toContainEqual(expect.objectContaining({ testId: "edges", because: "the client has not agreed to a contact liquid" }));
});

test("where the stone may be one that a liquid ruins, no liquid is recommended", () => {
  const { recommended, vetoed } = after({ ri: [{ kind: "spot", n: 1.62 }], opticCharacter: "aggregate", colour: ["blue"], transparency: "opaque" });
  expect(recommended.map(({ testId }) => testId)).not.toContain("edges");
  expect(vetoed.find(({ testId }) => testId === "edges" || testId === "density")?.because).toMatch(/it can damage/);
});

test("each recommendation says what it would tell apart, best first", () => {
  const { recommended } = after({ ri: [{ kind: "edges", low: 1.62, high: 1.63, rotated: false }], opticCharacter: "anisotropic", transparency: "transparent" });
  expect(recommended.length).toBeGreaterThan(2);
  for (const { settles } of recommended) expect(settles).toMatch(/^tells .+ from .+$/);
  expect([...recommended].sort((a, b) => b.worth - a.worth)).toEqual(recommended);
});

test("a stone that is told already asks for nothing more of its species", () => {
  expect(after({ ri: [{ kind: "edges", low: 1.544, high: 1.553, rotated: true }], sg: { value: 2.65, u: 0.005 }, opticCharacter: "uniaxial", opticSign: "+" }).recommended).toEqual([]);
});
