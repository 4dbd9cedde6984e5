import { expect, test } from "vitest";
import worked from "#fixtures/worked/rotation-examples.json" with { type: "json" };
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import type { RotationSolution } from "#app/gemmology/rotation/rotation-fit.ts";
import type { RotationReading } from "#app/gemmology/rotation/rotation-run.ts";
import type { PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { aFacet, onFacet, randomFrom } from "./a-rotation-run.ts";

const sorted = ({ indices }: RotationSolution) =>
  ("omega" in indices ? [indices.omega, indices.omega, indices.epsilon] : "n" in indices ? [indices.n, indices.n, indices.n] : "beta" in indices ? [indices.alpha, indices.beta, indices.gamma] : []).sort((a, b) => a - b);
const isLike = (solution: RotationSolution, expected: readonly number[], within = 0.0003) => expected.every((value, at) => Math.abs(sorted(solution)[at]! - value) < within);
const topaz: PrincipalIndices = [1.61, 1.613, 1.62];
const general = onFacet([0.5, 0.62, Math.sqrt(1 - 0.25 - 0.62 ** 2)]);

// Source: fixtures/worked/rotation-examples.json: an independent closed-form inversion.
test.each(worked.examples)("$name: the crystals are those of the closed form", ({ readings, solutions }) => {
  const fit = fitRotation({ facets: [{ label: "table", readings: readings.map(({ angleDeg, upper, lower }) => ({ angleDeg, upper, lower, u: 0.0001, polariserDeg: null })) }] });
  expect(fit.solutions).toHaveLength(solutions.length);
  for (const expected of solutions) expect(fit.solutions.some((solution) => isLike(solution, [...expected].sort((a, b) => a - b))), JSON.stringify({ expected, found: fit.solutions.map(sorted) })).toBe(true);
  expect(fit.decided).toBe(solutions.length === 1);
});

test("one facet leaves both β, and says at which rotation the polariser decides, which it then does", () => {
  const open = fitRotation({ facets: [aFacet(topaz, general)] });
  expect(open.decided).toBe(false);
  expect(open.solutions.map((solution) => sorted(solution)[1]!.toFixed(4)).sort()).toEqual(["1.6130", "1.6148"]);
  const angleDeg = Number(/to (\d+)°/.exec(open.decideBy)![1]);
  const facet = aFacet(topaz, general);
  const { readings } = aFacet(topaz, general, { stepDeg: 1, polariserAtDeg: [angleDeg] });
  const decided = fitRotation({ facets: [{ ...facet, readings: [...facet.readings, readings[angleDeg]!] }] });
  expect(decided.decided).toBe(true);
  expect(isLike(decided.solutions[0]!, topaz)).toBe(true);
});

test("a second facet decides, with shared indices", () => {
  const fit = fitRotation({ facets: [aFacet(topaz, general, { u: 0.0003 }), aFacet(topaz, onFacet([0.9, -0.2, 0.4]), { u: 0.0003, label: "crown" })] });
  expect(fit.decided).toBe(true);
  expect(isLike(fit.solutions[0]!, topaz)).toBe(true);
  expect(fit.solutions[0]!.orientation.map(({ facet }) => facet)).toEqual(["table", "crown"]);
});

test("a uniaxial stone on a leaning facet is uniaxial or else biaxial with a facet across an axis, until the polariser was read", () => {
  const quartz: PrincipalIndices = [1.5443, 1.5443, 1.5534];
  const axes = onFacet([Math.sin(0.6), 0, Math.cos(0.6)]);
  const open = fitRotation({ facets: [aFacet(quartz, axes)] });
  expect(open.decided).toBe(false);
  expect(open.solutions.map(({ character }) => character)).toEqual(["uniaxial", "biaxial"]);
  const decided = fitRotation({ facets: [aFacet(quartz, axes, { polariserAtDeg: [0, 30, 60, 90] })] });
  expect(decided).toMatchObject({ decided: true });
  expect(decided.solutions[0]).toMatchObject({ character: "uniaxial", sign: "+" });
});

test("a singly refractive stone has one index, however the readings scatter", () => {
  const { normal } = randomFrom(21);
  for (let turn = 0; turn < 40; turn++) {
    // One edge is seen, and read once at each rotation.
    const readings = Array.from({ length: 12 }, () => 1.718 + 0.0005 * normal()).map((edge, at): RotationReading => ({ angleDeg: at * 15, upper: edge, lower: edge, u: 0.0005, polariserDeg: null }));
    expect(fitRotation({ facets: [{ label: "table", readings }] }).solutions.map(({ character }) => character)).toEqual(["isotropic"]);
  }
});

test("few positions suffice where they must, and many that agree by mistake decide nothing", () => {
  const fit = fitRotation({ facets: [aFacet(topaz, general, { stepDeg: 45 })] });
  expect(fit.solutions.some((solution) => isLike(solution, topaz, 0.0005))).toBe(true);
  expect(() => fitRotation({ facets: [{ label: "table", readings: aFacet(topaz, general).readings.slice(0, 2) }] })).toThrow(RangeError);
});

test("a misreading is named with its angle and by how much, and does not carry the indices off", () => {
  const facet = aFacet([1.654, 1.671, 1.69], onFacet([0.7, 0.55, 0.455]), { u: 0.0005 });
  const readings = facet.readings.map((reading) => (reading.angleDeg === 75 ? { ...reading, upper: reading.upper! + 0.004 } : reading));
  const fit = fitRotation({ facets: [{ ...facet, readings }] });
  expect(fit.outliers[0]).toMatchObject({ angleDeg: 75, edge: "upper", facet: "table" });
  expect(fit.outliers[0]!.message).toMatch(/^the reading at 75° doesn't fit: \d\.\d u$/);
  expect(fit.solutions.some((solution) => isLike(solution, [1.654, 1.671, 1.69], 0.0012))).toBe(true);
});

test("a seat that moved shows a half turn later", () => {
  const facet = aFacet(topaz, general, { throughDeg: 360, stepDeg: 30 });
  const readings = facet.readings.map((reading) => (reading.angleDeg >= 180 ? { ...reading, upper: reading.upper! + 0.003, lower: reading.lower! + 0.003 } : reading));
  expect(fitRotation({ facets: [facet] }).closure).toEqual([]);
  expect(fitRotation({ facets: [{ ...facet, readings }] }).closure.length).toBeGreaterThan(5);
});

test("upper edges over the limit leave α and bounds", () => {
  const facet = aFacet([1.757, 1.757, 1.804], onFacet([0.6, 0.3, 0.74]), { u: 0.0005 }); // benitoite
  const fit = fitRotation({ facets: [{ ...facet, readings: facet.readings.map((reading): RotationReading => ({ ...reading, upper: null })) }] });
  expect(fit).toMatchObject({ decided: false, solutions: [{ character: "undetermined", sign: null }] });
  expect(fit.solutions[0]!.indices).toEqual({ alpha: expect.closeTo(1.757, 3) });
  expect(fit.decideBy).toMatch(/singly refractive|over the limit/);
});

test("the order of the readings changes nothing", () => {
  const facet = aFacet(topaz, general, { noise: randomFrom(3).normal });
  const [straight, reversed] = [fitRotation({ facets: [facet] }), fitRotation({ facets: [{ ...facet, readings: [...facet.readings].reverse() }] })];
  expect(sorted(reversed.solutions[0]!).map((value) => value.toFixed(6))).toEqual(sorted(straight.solutions[0]!).map((value) => value.toFixed(6)));
});

// Source: an independently written fit of readings rounded to 0.001, started from its own closed form.
test.each([
  ["1 ", [1.544, 1.544, 1.5533], [1.544, 1.5505, 1.5533]],
  ["5 ", [1.6099, 1.6131, 1.6202], [1.6099, 1.6148, 1.6202]],
  ["7 ", [1.6539, 1.6667, 1.6901], [1.6539, 1.6711, 1.6901]],
])("example %s: readings rounded to 0.001 lead to both crystals, to 0.0003", (which, one, other) => {
  const { readings } = worked.examples[Number(which) - 1]!;
  const rounded = readings.map(({ angleDeg, upper, lower }) => ({ angleDeg, upper: Number(upper.toFixed(3)), lower: Number(lower.toFixed(3)), u: 0.0003, polariserDeg: null }));
  const fit = fitRotation({ facets: [{ label: "table", readings: rounded }] });
  for (const expected of [one, other]) expect(fit.solutions.some((solution) => isLike(solution, expected, 0.0003)), JSON.stringify(fit.solutions.map(sorted))).toBe(true);
  expect(fit.solutions[0]!.rms).toBeGreaterThan(0.0001);
  expect(fit.solutions[0]!.rms).toBeLessThan(0.0004);
});

// Source: as above, its linearised standard deviations at 12 positions and 0.0010 of noise; α, β, γ of the true crystal.
test.each([
  ["5 ", [0.0005, 0.00054, 0.00051]],
  ["7 ", [0.00049, 0.0006, 0.0005]],
])("example %s: uncertainties are those of an independent linearisation", (which, expected) => {
  const { indices, readings } = worked.examples[Number(which) - 1]!;
  const fit = fitRotation({ facets: [{ label: "table", readings: readings.map(({ angleDeg, upper, lower }) => ({ angleDeg, upper, lower, u: 0.001, polariserDeg: null })) }] });
  const own = fit.solutions.filter(({ character }) => character === "biaxial").find((solution) => isLike(solution, indices, 0.0003))!;
  (["alpha", "beta", "gamma"] as const).forEach((name, at) => expect(own.u[name]! / expected[at]!).toBeCloseTo(1, 0.5));
});

test("nothing is known of β where the readings do not hold it, but that it lies between", () => {
  const readings = aFacet(topaz, general).readings.slice(0, 3);
  for (const { character, indices, u } of fitRotation({ facets: [{ label: "table", readings }] }).solutions) {
    if (character !== "biaxial" || !("beta" in indices)) continue;
    expect(u.beta!).toBeLessThanOrEqual((indices.gamma - indices.alpha) / Math.sqrt(12));
  }
});

test("the largest run that is let in is fitted within a second", () => {
  const { normal } = randomFrom(6);
  const facets = Array.from({ length: 6 }, (_, at) => aFacet(topaz, onFacet([normal(), normal(), normal()]), { stepDeg: 3.6, throughDeg: 360, label: `facet ${at}`, noise: normal }));
  expect(facets.map(({ readings }) => readings.length)).toEqual([100, 100, 100, 100, 100, 100]);
  const startedAt = performance.now();
  const fit = fitRotation({ facets });
  // Several times what it takes, for a machine at work on other things.
  expect(performance.now() - startedAt).toBeLessThan(4_000);
  expect(isLike(fit.solutions[0]!, topaz)).toBe(true);
});
