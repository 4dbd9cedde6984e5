import { requireRange } from "../require-range.ts";

/**
 * How deep something seems to lie that is so deep in a stone, seen straight down from air.
 *
 *   d_seen = d √(1 − NA²) / √(n² − NA²)
 *
 * @param numericalAperture of the objective; 0 for the eye
 * @throws RangeError
 *
 * Source: Snell's law for the marginal ray.
 */
export function apparentDepthMm({ realMm, n, numericalAperture = 0 }: { realMm: number; n: number; numericalAperture?: number }): number {
  requireRange("realMm", realMm, realMm >= 0);
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("numericalAperture", numericalAperture, numericalAperture >= 0 && numericalAperture < 1);
  return (realMm * Math.sqrt(1 - numericalAperture ** 2)) / Math.sqrt(n ** 2 - numericalAperture ** 2);
}
