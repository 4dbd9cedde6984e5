import { requireRange } from "../require-range.ts";

/**
 * Index from the share of light that one polished face sends back at normal incidence. Coatings, scratches and light from
 * faces behind bias it beyond the uncertainty; infrared reflectance gives the infrared index.
 *
 * @param reflectance 0 to below 1, of one face in air
 * @param uReflectance standard uncertainty of it, ≥ 0
 * @returns the index, above 1, and its standard uncertainty, dimensionless, unrounded
 * @throws RangeError when an argument leaves its range, or the index would exceed 4
 *
 * Source: Fresnel's equations at normal incidence, solved for n; propagation by JCGM 100:2008, 5.1.2.
 * @example indexFromReflectance({ reflectance: 0.1719 }).n // ≈ 2.417
 */
export function indexFromReflectance({ reflectance, uReflectance = 0.005 }: { reflectance: number; uReflectance?: number }): { n: number; u: number } {
  requireRange("reflectance", reflectance, reflectance > 0 && reflectance < 1);
  requireRange("uReflectance", uReflectance, uReflectance >= 0);
  const amplitude = Math.sqrt(reflectance);
  const n = (1 + amplitude) / (1 - amplitude);
  requireRange("n", n, n <= 4);
  return { n, u: uReflectance / (amplitude * (1 - amplitude) ** 2) };
}
