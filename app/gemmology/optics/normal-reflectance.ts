import { requireRange } from "../require-range.ts";

/**
 * Share of light that one polished face sends back at normal incidence.
 *
 * @param n index of the stone, in [1, 4]; transparent, so that its absorption does not count
 * @param nOutside index of what is outside, in [1, 4]; air is 1
 * @returns reflectance of the one face, 0 to 1, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: Fresnel's equations at normal incidence, standard optics.
 * @example normalReflectance({ n: 2.417 }) // ≈ 0.172, diamond in air
 */
export function normalReflectance({ n, nOutside = 1 }: { n: number; nOutside?: number }): number {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("nOutside", nOutside, nOutside >= 1 && nOutside <= 4);
  return ((n - nOutside) / (n + nOutside)) ** 2;
}
