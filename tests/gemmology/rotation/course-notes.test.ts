import { expect, test } from "vitest";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { usualEdgeU } from "#app/gemmology/rotation/rotation-run.ts";
import { workedOn } from "../worked-on.ts";

const tables = workedOn("optic character/sign from rotation table");

/*
 * The course notes print four pairs a stone without their rotations; eighths of a turn are assumed. Their character and
 * sign are among the solutions, with the extremes that they read. Their β, the mean of all readings, is no β: it is not
 * asked for (formulas.md §4.4).
 */
test.each(tables)("$id: $expected.species ($source)", ({ inputs, expected }) => {
  const pairs = inputs.pairs as unknown as readonly (readonly [number, number])[];
  const fit = fitRotation({ facets: [{ label: "table", readings: pairs.map(([lower, upper], at) => ({ angleDeg: 45 * at, upper, lower, u: usualEdgeU, polariserDeg: null })) }] });
  const alike = fit.solutions.filter(({ character, sign }) => character === (expected.character as unknown as string) && (sign === null || character === "biaxial" || sign === (expected.sign as unknown as string)));
  expect(alike.length).toBeGreaterThan(0);
  const within = 2.5 * usualEdgeU;
  expect(
    alike.some(({ indices }) => {
      if ("omega" in indices) return Math.abs(indices.omega - expected.no!) < within && Math.abs(indices.epsilon - expected.ne!) < within;
      return "beta" in indices && Math.abs(indices.alpha - expected.alpha!) < within && Math.abs(indices.gamma - expected.gamma!) < within;
    }),
  ).toBe(true);
  // Four positions decide less than the notes take from them, but contradict nothing.
  expect(fit.outliers).toEqual([]);
});

test("all four tables were used", () => {
  expect(tables).toHaveLength(4);
});
