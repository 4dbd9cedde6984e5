import { requireRange } from "../require-range.ts";

/**
 * Optic angle as it appears in air, 2E.
 *
 * @param twoVDeg optic angle inside the crystal, degrees, in (0, 180)
 * @param beta middle index, in [1, 4]
 * @returns degrees; null where the axes leave the crystal by total reflection and no 2E exists
 * @throws RangeError when an argument leaves its range
 *
 * Source: sin E = n_β sin V, crystal optics.
 * @example apparentOpticAngleDeg({ twoVDeg: 66.7, beta: 1.613 }) // ≈ 124.9
 */
export function apparentOpticAngleDeg({ twoVDeg, beta }: { twoVDeg: number; beta: number }): number | null {
  requireRange("twoVDeg", twoVDeg, twoVDeg > 0 && twoVDeg < 180);
  requireRange("beta", beta, beta >= 1 && beta <= 4);
  const sine = beta * Math.sin((twoVDeg * Math.PI) / 360);
  return sine > 1 ? null : (2 * Math.asin(sine) * 180) / Math.PI;
}
