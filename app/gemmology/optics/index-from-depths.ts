import { requireRange } from "../require-range.ts";

export type IndexFromDepths = Readonly<{
  n: number;
  u: number;
  /** By how much the aperture can make n read too high: one-sided, beside the uncertainty and not within it. */
  readsHighByAtMost: number;
}>;

/**
 * Index from the real and the apparent depth under a plane face, focused with a microscope looking straight down.
 *
 * @param realMm measured depth, mm, > 0
 * @param apparentMm travel of the focus, mm, in (0, realMm]
 * @param uRealMm standard uncertainty of the measured depth, mm, ≥ 0
 * @param uApparentMm standard uncertainty of the travel, mm, ≥ 0
 * @param numericalAperture of the objective, in [0, 0.9]; rays at its edge make the stone look shallower
 * @returns the index by rays near the normal, its standard uncertainty, and the bound of the aperture's bias
 * @throws RangeError when an argument leaves its range, or the index would exceed 4
 *
 * Source: Snell's law; a marginal ray gives √(n² − NA²)/√(1 − NA²) instead of n. Propagation by JCGM 100:2008, 5.1.2.
 * @example indexFromDepths({ realMm: 4.12, apparentMm: 2.33 }) // n ≈ 1.768, u ≈ 0.017
 */
export function indexFromDepths({ realMm, apparentMm, uRealMm = 0.02, uApparentMm = 0.02, numericalAperture = 0 }: { realMm: number; apparentMm: number; uRealMm?: number; uApparentMm?: number; numericalAperture?: number }): IndexFromDepths {
  requireRange("realMm", realMm, realMm > 0);
  requireRange("apparentMm", apparentMm, apparentMm > 0 && apparentMm <= realMm);
  requireRange("uRealMm", uRealMm, uRealMm >= 0);
  requireRange("uApparentMm", uApparentMm, uApparentMm >= 0);
  requireRange("numericalAperture", numericalAperture, numericalAperture >= 0 && numericalAperture <= 0.9);
  const n = realMm / apparentMm;
  requireRange("n", n, n <= 4);
  const byMarginalRays = Math.sqrt(n ** 2 * (1 - numericalAperture ** 2) + numericalAperture ** 2);
  return { n, u: n * Math.hypot(uRealMm / realMm, uApparentMm / apparentMm), readsHighByAtMost: n - byMarginalRays };
}
