import { requireRange } from "../require-range.ts";

/**
 * Angle of incidence at which a face reflects no light that vibrates in the plane of incidence.
 *
 * @param n index of the stone, in [1, 4]; transparent
 * @param nOutside index on the side of the incident light, in [1, 4]; air is 1
 * @returns angle from the normal, degrees
 * @throws RangeError when an argument leaves its range
 *
 * Source: Brewster's law, standard optics.
 * @example brewsterAngleDeg({ n: 2.417 }) // ≈ 67.52
 */
export function brewsterAngleDeg({ n, nOutside = 1 }: { n: number; nOutside?: number }): number {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("nOutside", nOutside, nOutside >= 1 && nOutside <= 4);
  return (Math.atan(n / nOutside) * 180) / Math.PI;
}
