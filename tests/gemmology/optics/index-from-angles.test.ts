import fc from "fast-check";
import { expect, test } from "vitest";
import { brewsterAngleDeg } from "#app/gemmology/optics/brewster-angle-deg.ts";
import { criticalAngleDeg } from "#app/gemmology/optics/critical-angle-deg.ts";
import { indexFromBrewsterAngle } from "#app/gemmology/optics/index-from-brewster-angle.ts";
import { indexFromRefraction } from "#app/gemmology/optics/index-from-refraction.ts";
import { indexFromTotalReflection } from "#app/gemmology/optics/index-from-total-reflection.ts";
import { prismExitDeg } from "#app/gemmology/optics/prism-exit-deg.ts";
import { refractionAngleDeg } from "#app/gemmology/optics/refraction-angle-deg.ts";
import { workedOn } from "../worked-on.ts";

const snell = workedOn("Snell");
const anIndex = fc.double({ min: 1, max: 4, noNaN: true });

// Books print two decimals of an index that they work out from whole or tenth degrees.
test.each(snell.filter(({ expected }) => expected.n2 !== undefined))("$id: index from both angles ($source)", ({ inputs, expected }) => {
  const n = indexFromRefraction({ n1: inputs.n1!, incidenceDeg: inputs.angle1_deg!, refractionDeg: inputs.angle2_deg! });
  expect(Math.abs(n - expected.n2!)).toBeLessThanOrEqual(0.0051);
});

// Light goes the same way back.
test.each(snell.filter(({ inputs }) => inputs.angle_refracted_deg !== undefined))("$id: angle of incidence ($source)", ({ inputs, expected }) => {
  const incidenceDeg = refractionAngleDeg({ n1: inputs.n2!, n2: inputs.n1!, incidenceDeg: inputs.angle_refracted_deg! });
  expect(Math.abs(incidenceDeg! - expected.angle_incident_deg!)).toBeLessThanOrEqual(0.51);
});

test.each(workedOn("Snell (impossible result)"))("$id: an impossible index is refused with its value ($source)", ({ inputs, expected }) => {
  const measured = { n1: inputs.n1!, incidenceDeg: inputs.angle1_deg!, refractionDeg: inputs.angle2_deg! };
  let refusal: unknown;
  try {
    indexFromRefraction(measured);
  } catch (error) {
    refusal = error;
  }
  expect(refusal).toBeInstanceOf(RangeError);
  const named = /^n2 out of range: (.+)$/.exec((refusal as RangeError).message);
  // The book prints 0.898 and 5.0.
  expect(Math.abs(Number(named![1]) - expected.n2!)).toBeLessThanOrEqual(0.051);
});

test.each(workedOn("RI from a critical angle in an immersion medium"))("$id: index from total reflection under water ($source)", ({ inputs, expected }) => {
  const n = indexFromTotalReflection({ criticalDeg: inputs.critical_angle_deg!, nOutside: inputs.n_medium! });
  expect(Math.abs(n - expected.ri!)).toBeLessThanOrEqual(0.0051);
  expect(Math.abs(criticalAngleDeg({ nDense: n }) - expected.critical_angle_in_air_deg!)).toBeLessThanOrEqual(0.051);
});

test.each(workedOn("Brewster angle"))("$id: Brewster's angle ($source)", ({ inputs, expected }) => {
  const tolerance = Number.isInteger(expected.brewster_deg! * 10) ? 0.051 : 0.0051;
  expect(Math.abs(brewsterAngleDeg({ n: inputs.n2!, nOutside: inputs.n1! }) - expected.brewster_deg!)).toBeLessThanOrEqual(tolerance);
});

test.each(workedOn("RI from Brewster angle"))("$id: index from Brewster's angle, and its angle under water ($source)", ({ inputs, expected }) => {
  const { n } = indexFromBrewsterAngle({ brewsterDeg: inputs.brewster_deg!, nOutside: inputs.n1! });
  expect(Math.abs(n - expected.ri!)).toBeLessThanOrEqual(0.0051);
  expect(Math.abs(brewsterAngleDeg({ n, nOutside: 1.333 }) - expected.brewster_in_water_deg!)).toBeLessThanOrEqual(0.051);
});

// arctan of the index by tables of tangents.
test.each([[1.544, 57.07], [1.77, 60.53], [2.417, 67.52]])("a face of index %s has Brewster's angle %s°", (n, deg) => {
  expect(brewsterAngleDeg({ n })).toBeCloseTo(deg, 2);
});

test("a degree of Brewster's angle is 0.059 of index at quartz and 0.119 at diamond", () => {
  expect(indexFromBrewsterAngle({ brewsterDeg: 57.07, uBrewsterDeg: 1 }).u).toBeCloseTo(0.0591, 3);
  expect(indexFromBrewsterAngle({ brewsterDeg: 67.52, uBrewsterDeg: 1 }).u).toBeCloseTo(0.1194, 3);
});

test.each(workedOn("dispersion refraction"))("$id: red and violet in water ($source)", ({ inputs, expected }) => {
  expect(Math.abs(refractionAngleDeg({ n1: 1, n2: inputs.n_red_660!, incidenceDeg: inputs.incident_deg! })! - expected.red_deg!)).toBeLessThanOrEqual(0.051);
  expect(Math.abs(refractionAngleDeg({ n1: 1, n2: inputs.n_violet_410!, incidenceDeg: inputs.incident_deg! })! - expected.violet_deg!)).toBeLessThanOrEqual(0.051);
});

test.each(workedOn("prism refraction (crown glass)"))("$id: red and violet leave a prism ($source)", ({ inputs, expected }) => {
  const exit = (n: number) => prismExitDeg({ n, apexDeg: inputs.prism_apex_deg!, incidenceDeg: inputs.incident_deg! })!;
  expect(Math.abs(exit(inputs.n_red_660!) - expected.red_exit_deg!)).toBeLessThanOrEqual(0.051);
  expect(Math.abs(exit(inputs.n_violet_410!) - expected.violet_exit_deg!)).toBeLessThanOrEqual(0.051);
});

test("a prism deviates least where the ray passes it evenly, and then by the goniometer's formula n = sin((A + D)/2)/sin(A/2)", () => {
  const [n, apexDeg] = [1.62, 60];
  const deviation = (incidenceDeg: number) => incidenceDeg + prismExitDeg({ n, apexDeg, incidenceDeg })! - apexDeg;
  const least = Math.min(...Array.from({ length: 400 }, (_, at) => deviation(45 + at * 0.05)));
  const half = Math.PI / 360;
  expect(Math.sin((apexDeg + least) * half) / Math.sin(apexDeg * half)).toBeCloseTo(n, 5);
});

test("a prism of a strong stone lets nothing out", () => {
  expect(prismExitDeg({ n: 2.417, apexDeg: 60, incidenceDeg: 20 })).toBeNull();
});

test("each way of measuring an index finds the index it began with", () => {
  fc.assert(
    fc.property(fc.double({ min: 1.01, max: 3.9, noNaN: true }), anIndex, fc.double({ min: 1, max: 89, noNaN: true }), (n, outside, incidenceDeg) => {
      const refractionDeg = refractionAngleDeg({ n1: outside, n2: n, incidenceDeg });
      if (refractionDeg !== null) expect(indexFromRefraction({ n1: outside, incidenceDeg, refractionDeg })).toBeCloseTo(n, 7);
      expect(indexFromBrewsterAngle({ brewsterDeg: brewsterAngleDeg({ n, nOutside: outside }), nOutside: outside }).n).toBeCloseTo(n, 9);
      if (outside < n) expect(indexFromTotalReflection({ criticalDeg: criticalAngleDeg({ nDense: n, nRare: outside }), nOutside: outside })).toBeCloseTo(n, 6);
    }),
  );
});

test.each([
  ["brewsterDeg", () => indexFromBrewsterAngle({ brewsterDeg: 90 })],
  ["n", () => indexFromBrewsterAngle({ brewsterDeg: 40 })],
  ["uBrewsterDeg", () => indexFromBrewsterAngle({ brewsterDeg: 60, uBrewsterDeg: -1 })],
  ["incidenceDeg", () => indexFromRefraction({ n1: 1, incidenceDeg: 0, refractionDeg: 20 })],
  ["criticalDeg", () => indexFromTotalReflection({ criticalDeg: Number.NaN })],
  ["n", () => indexFromTotalReflection({ criticalDeg: 10 })],
  ["apexDeg", () => prismExitDeg({ n: 1.5, apexDeg: 0, incidenceDeg: 10 })],
])("%s outside its range is refused by name", (name, call) => {
  expect(call).toThrow(new RegExp(`^${name} out of range`));
  expect(call).toThrow(RangeError);
});
