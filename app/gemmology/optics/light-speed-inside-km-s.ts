import { requireRange } from "../require-range.ts";

/** Speed of light in vacuum, km/s; exact, it defines the metre (SI Brochure, 9th edition 2019, 2.3.1). */
const vacuumKmS = 299_792.458;

/**
 * Phase speed of light of the index's wavelength inside a stone.
 *
 * @param n index of the ray, in [1, 4]
 * @returns speed, km/s, unrounded
 * @throws RangeError when the index leaves its range
 *
 * Source: v = c/n, the definition of the refractive index.
 * @example lightSpeedInsideKmS({ n: 2.417 }) // ≈ 124 035
 */
export function lightSpeedInsideKmS({ n }: { n: number }): number {
  requireRange("n", n, n >= 1 && n <= 4);
  return vacuumKmS / n;
}
