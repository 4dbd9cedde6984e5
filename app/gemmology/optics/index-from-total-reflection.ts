import { requireRange } from "../require-range.ts";

/**
 * Index of a solid from the critical angle inside it, against a rarer medium around it.
 *
 * @param criticalDeg angle from the normal inside the solid, degrees, in (0, 90]
 * @param nOutside index of what is outside, in [1, 4]; air is 1
 * @returns index of the solid, unrounded
 * @throws RangeError when an argument leaves its range, or the index would exceed 4
 *
 * Source: Snell's law at grazing refraction, standard optics.
 * @example indexFromTotalReflection({ criticalDeg: 24.44 }) // ≈ 2.417
 */
export function indexFromTotalReflection({ criticalDeg, nOutside = 1 }: { criticalDeg: number; nOutside?: number }): number {
  requireRange("criticalDeg", criticalDeg, criticalDeg > 0 && criticalDeg <= 90);
  requireRange("nOutside", nOutside, nOutside >= 1 && nOutside <= 4);
  const n = nOutside / Math.sin((criticalDeg * Math.PI) / 180);
  requireRange("n", n, n <= 4);
  return n;
}
