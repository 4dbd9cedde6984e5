import { requireRange } from "../require-range.ts";

/**
 * A lower bound of the birefringence from doubling that was seen: the direction is hardly ever the one of most doubling.
 *
 *   Δn ≥ n s / d
 *
 * @param n mean index
 * @throws RangeError
 *
 * Source: small-angle walk-off, tan ρ ≤ Δn/n.
 */
export function leastBirefringenceFromDoubling({ n, doublingMm, pathMm }: { n: number; doublingMm: number; pathMm: number }): number {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("pathMm", pathMm, pathMm > 0);
  requireRange("doublingMm", doublingMm, doublingMm >= 0 && doublingMm < pathMm);
  return (n * doublingMm) / pathMm;
}
