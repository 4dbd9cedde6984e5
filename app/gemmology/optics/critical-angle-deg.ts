import { requireRange } from "../require-range.ts";

/**
 * Critical angle of total reflection, from the denser into the rarer medium.
 *
 * @param nDense index of the denser medium, in (nRare, 4]
 * @param nRare index of the rarer medium, in [1, nDense); air is 1
 * @returns angle from the normal, degrees
 * @throws RangeError when an argument leaves its range
 *
 * Source: Snell's law at grazing refraction, standard optics.
 * @example criticalAngleDeg({ nDense: 2.417, nRare: 1 }) // ≈ 24.44, diamond in air
 */
export function criticalAngleDeg({ nDense, nRare = 1 }: { nDense: number; nRare?: number }): number {
  requireRange("nRare", nRare, nRare >= 1 && nRare < 4);
  requireRange("nDense", nDense, nDense > nRare && nDense <= 4);
  return (Math.asin(nRare / nDense) * 180) / Math.PI;
}
