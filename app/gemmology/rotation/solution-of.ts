import { opticAngle } from "../optics/optic-angle.ts";
import type { AxisOnFacet, RotationSolution } from "./rotation-fit.ts";
import type { RotationRun } from "./rotation-run.ts";
import type { Candidate } from "./simpler-crystals.ts";
import type { Vector } from "./vector.ts";

const degree = Math.PI / 180;

/** A minimum in the trade's words, with standard uncertainties widened by a factor. */
export function solutionOf({ crystal, covariance, gapAtMost }: Candidate, { facets }: RotationRun, { deltaChiSquared, widen, rms }: { deltaChiSquared: number; widen: number; rms: number }): RotationSolution {
  const shared = { rms, deltaChiSquared };
  const u = (at: number) => widen * Math.sqrt(Math.max(0, covariance[at]![at]!));
  const gap = (i: number, j: number) => widen * Math.sqrt(Math.max(0, covariance[i]![i]! + covariance[j]![j]! - 2 * covariance[i]![j]!));
  if (crystal.rank === 1) return { character: "isotropic", sign: null, indices: { n: crystal.free[0]! }, u: { n: u(0) }, birefringence: null, twoVDeg: null, orientation: [], ...shared };
  if (crystal.rank === 2) {
    const [omega, epsilon] = crystal.free as unknown as [number, number];
    const orientation = facets.map(({ label }, at) => ({ facet: label, axes: [onFacet("c", crystal.axes[at]![2])] }));
    return { character: "uniaxial", sign: epsilon > omega ? "+" : "-", indices: { omega, epsilon }, u: { omega: u(0), epsilon: u(1) }, birefringence: { value: Math.abs(epsilon - omega), u: gap(0, 1) }, twoVDeg: null, orientation, ...shared, ...(gapAtMost === undefined ? {} : { bounds: { gapAtMost } }) };
  }
  const at = crystal.free.map((value, index) => ({ value, index })).sort((a, b) => a.value - b.value).map(({ index }) => index) as [number, number, number];
  const [alpha, beta, gamma] = at.map((index) => crystal.free[index]!) as [number, number, number];
  const sorted = at.map((i) => at.map((j) => covariance[i]![j]! * widen ** 2));
  const angle = opticAngle({ alpha, beta, gamma: Math.max(gamma, alpha + 1e-12), covariance: sorted });
  const orientation = facets.map(({ label }, facet) => ({ facet: label, axes: (["X", "Y", "Z"] as const).map((name, index) => onFacet(name, crystal.axes[facet]![at[index]!]!)) }));
  return {
    character: "biaxial",
    sign: angle.sign,
    indices: { alpha, beta, gamma },
    // β lies between the others, whatever else is known of it: a rectangular distribution at the widest (JCGM 100:2008, 4.3.7).
    u: { alpha: u(at[0]), beta: Math.min(u(at[1]), (gamma - alpha) / Math.sqrt(12)), gamma: u(at[2]) },
    birefringence: { value: gamma - alpha, u: gap(at[0], at[2]) },
    twoVDeg: { value: angle.twoVDeg, u: angle.uDeg },
    orientation,
    ...shared,
  };
}

function onFacet(axis: AxisOnFacet["axis"], [x, y, z]: Vector): AxisOnFacet {
  return { axis, fromNormalDeg: Math.acos(Math.min(1, Math.abs(z))) / degree, azimuthDeg: ((Math.atan2(y * Math.sign(z || 1), x * Math.sign(z || 1)) / degree) % 180 + 180) % 180 };
}
