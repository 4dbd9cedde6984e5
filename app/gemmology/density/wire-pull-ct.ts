import { requireRange } from "../require-range.ts";

/** Surface tension of clean water near room temperature, N/m (a textbook value). */
const surfaceTensionNM = 0.072;
const gravityMS2 = 9.80665;

/**
 * How hard the water's surface pulls the wire on which a stone hangs. It cancels as long as the wire is wetted alike; a
 * share of it that changes between two readings is an error of the weighing.
 *
 * @param wireMm diameter of the wire where it meets the surface, mm, > 0
 * @param share of the pull that changes, 0 to 1
 * @returns ct, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: π d γ, standard physics. A drop of wetting agent lowers it.
 * @example wirePullCt({ wireMm: 0.1, share: 0.1 }) // ≈ 0.0012
 */
export function wirePullCt({ wireMm, share = 1 }: { wireMm: number; share?: number }): number {
  requireRange("wireMm", wireMm, wireMm > 0);
  requireRange("share", share, share >= 0 && share <= 1);
  const newton = Math.PI * (wireMm / 1000) * surfaceTensionNM * share;
  return ((newton / gravityMS2) * 1000) / 0.2;
}
