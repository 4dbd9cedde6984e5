import { requireRange } from "../require-range.ts";

/**
 * Depth at which something under a plane face seems to lie, seen straight down.
 *
 * @param realMm real depth, mm, > 0
 * @param n index above what is seen, in [1, 4]
 * @param nObserver index on the observer's side, in [1, 4]; air is 1
 * @returns mm, by rays near the normal
 * @throws RangeError when an argument leaves its range
 *
 * Source: Snell's law for small angles, standard optics.
 * @example apparentDepthMm({ realMm: 4.12, n: 1.768 }) // ≈ 2.33
 */
export function apparentDepthMm({ realMm, n, nObserver = 1 }: { realMm: number; n: number; nObserver?: number }): number {
  requireRange("realMm", realMm, realMm > 0);
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("nObserver", nObserver, nObserver >= 1 && nObserver <= 4);
  return (realMm * nObserver) / n;
}
