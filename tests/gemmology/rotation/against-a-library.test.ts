import { levenbergMarquardt } from "ml-levenberg-marquardt";
import { inverse, Matrix } from "ml-matrix";
import { expect, test } from "vitest";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import type { PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { aFacet, onFacet, randomFrom } from "./a-rotation-run.ts";

/**
 * A uniaxial crystal's edges in closed form, for an axis at `leanDeg` to the normal, along the prism at `zeroDeg`; x below
 * 1000 asks for the moving edge at that rotation, above for the constant one.
 */
const closedForm = ([omega, epsilon, leanDeg, zeroDeg]: readonly number[]) => (x: number) => {
  if (x >= 1000) return omega!;
  const degree = Math.PI / 180;
  const [cn, cs] = [Math.cos(leanDeg! * degree), Math.sin(leanDeg! * degree) * Math.cos((x - zeroDeg!) * degree)];
  const a = epsilon! ** -2;
  const d = omega! ** -2 - a;
  return Math.sqrt((a + d * cn * cn) / (a * (a + d * (cs * cs + cn * cn))));
};

test.each([["quartz", 1.5443, 1.5534], ["tourmaline", 1.64, 1.62], ["zircon", 1.925, 1.984], ["calcite", 1.6584, 1.4864]])("%s: a general-purpose fit of the closed form finds the same indices and uncertainties", (_, omega, epsilon) => {
  const { normal } = randomFrom(Math.round(omega * 1e4));
  const u = 0.0002;
  // Within two standard uncertainties, so that a fit that trusts every reading is the right one.
  const noise = () => Math.max(-2, Math.min(2, normal()));
  const lean = (52 * Math.PI) / 180;
  const indices: PrincipalIndices = [omega, omega, epsilon];
  const facet = aFacet(indices, onFacet([Math.sin(lean), 0, Math.cos(lean)]), { u, noise });
  const isPositive = epsilon > omega;
  const x = facet.readings.flatMap(({ angleDeg }) => [angleDeg, 1000 + angleDeg]);
  const y = facet.readings.flatMap(({ upper, lower }) => (isPositive ? [upper!, lower!] : [lower!, upper!]));
  // Rotation 0 points towards the axis as far as the facet lets it.
  const { parameterValues } = levenbergMarquardt({ x, y }, closedForm, { initialValues: [omega + 0.001, epsilon - 0.001, 45, 3], damping: 1e-6, gradientDifference: 1e-6, centralDifference: true, maxIterations: 300, errorTolerance: 0, improvementThreshold: 0 });
  const ours = fitRotation({ facets: [facet] }).solutions.find(({ character }) => character === "uniaxial")!;
  const found = ours.indices as { omega: number; epsilon: number };
  expect(Math.abs(found.omega - parameterValues[0]!)).toBeLessThan(0.03 * u);
  expect(Math.abs(found.epsilon - parameterValues[1]!)).toBeLessThan(0.03 * u);

  const steps = [1e-6, 1e-6, 1e-3, 1e-3];
  const jacobian = x.map((at) => steps.map((step, k) => (closedForm(parameterValues.map((value, i) => (i === k ? value + step : value)))(at) - closedForm(parameterValues.map((value, i) => (i === k ? value - step : value)))(at)) / (2 * step)));
  const covariance = inverse(new Matrix(jacobian).transpose().mmul(new Matrix(jacobian))).mul(u * u);
  expect(ours.u.omega! / Math.sqrt(covariance.get(0, 0))).toBeCloseTo(1, 1.5);
  expect(ours.u.epsilon! / Math.sqrt(covariance.get(1, 1))).toBeCloseTo(1, 1.5);
});
