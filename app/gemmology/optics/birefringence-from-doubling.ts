import { requireRange } from "../require-range.ts";

/**
 * Least birefringence that an observed doubling allows; the stone has as much or more, for the direction is unknown.
 *
 * @param n index of the stone, in [1, 4]
 * @param separationMm distance of the two images, mm, ≥ 0
 * @param depthMm path inside the stone, mm, > 0
 * @param uSeparationMm standard uncertainty of the distance, mm, ≥ 0
 * @returns a lower bound and its standard uncertainty, dimensionless, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: tan ρ ≤ Δn/n to first order in Δn, crystal optics.
 * @example birefringenceFromDoubling({ n: 1.95, separationMm: 0.1, depthMm: 4 }).atLeast // ≈ 0.049
 */
export function birefringenceFromDoubling({ n, separationMm, depthMm, uSeparationMm = 0.01 }: { n: number; separationMm: number; depthMm: number; uSeparationMm?: number }): { atLeast: number; u: number } {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("separationMm", separationMm, separationMm >= 0);
  requireRange("depthMm", depthMm, depthMm > 0);
  requireRange("uSeparationMm", uSeparationMm, uSeparationMm >= 0);
  return { atLeast: (n * separationMm) / depthMm, u: (n * uSeparationMm) / depthMm };
}
