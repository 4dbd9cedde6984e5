import { requireRange } from "../require-range.ts";

/**
 * Index from the polarising angle in air, with its standard uncertainty.
 *
 *   n = tan θ_B,   dn/dθ = 1 + n² per radian
 *
 * @param angleDeg 45 to 76
 * @param uDeg standard uncertainty of the angle; 0.3° for a trained operator (common practice)
 * @throws RangeError
 *
 * Source: Brewster's law; propagation by JCGM 100:2008.
 */
export function indexFromBrewster({ angleDeg, uDeg = 0.3 }: { angleDeg: number; uDeg?: number }): { n: number; u: number } {
  requireRange("angleDeg", angleDeg, angleDeg >= 45 && angleDeg <= 76);
  requireRange("uDeg", uDeg, uDeg >= 0);
  const n = Math.tan((angleDeg * Math.PI) / 180);
  return { n, u: (1 + n * n) * ((uDeg * Math.PI) / 180) };
}
