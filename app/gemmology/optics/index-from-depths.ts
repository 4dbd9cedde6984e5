import { requireRange } from "../require-range.ts";

type Depths = {
  realMm: number;
  apparentMm: number;
  /** Standard uncertainty of each, in millimetres. */
  uMm?: number;
  /** Numerical aperture of the objective; 0 takes rays near the axis only. */
  numericalAperture?: number;
};

/**
 * Index from real and apparent depth through a flat table, seen straight down, with the bias of the aperture taken out: an
 * objective that focuses on its marginal rays reads
 *
 *   n_seen = √(n² − NA²) / √(1 − NA²),   so   n = √(n_seen² (1 − NA²) + NA²)
 *
 * @throws RangeError when the apparent depth is not the smaller
 *
 * Source: Snell's law; propagation by JCGM 100:2008.
 */
export function indexFromDepths({ realMm, apparentMm, uMm = 0.02, numericalAperture = 0 }: Depths): { n: number; u: number } {
  requireRange("realMm", realMm, realMm > 0 && realMm < 1_000);
  requireRange("apparentMm", apparentMm, apparentMm > 0 && apparentMm < realMm);
  requireRange("uMm", uMm, uMm >= 0);
  requireRange("numericalAperture", numericalAperture, numericalAperture >= 0 && numericalAperture < 0.9);
  const seen = realMm / apparentMm;
  const square = 1 - numericalAperture ** 2;
  const n = Math.sqrt(seen ** 2 * square + numericalAperture ** 2);
  const uSeen = seen * Math.hypot(uMm / realMm, uMm / apparentMm);
  return { n, u: ((seen * square) / n) * uSeen };
}
