import { requireRange } from "../require-range.ts";
import { walkOffDeg } from "./walk-off-deg.ts";

/** Width that is seen with a tenfold loupe: a fifth of a millimetre for the eye (common practice). */
export const doublingSeenMm = 0.025;

/**
 * How far apart the two images of a facet edge lie at most, after so much path in a uniaxial stone.
 *
 * @param pathMm through the stone, in a direction far from the optic axis
 * @throws RangeError
 *
 * Source: largest walk-off of the extraordinary ray.
 */
export function doublingMm({ omega, epsilon, pathMm }: { omega: number; epsilon: number; pathMm: number }): number {
  requireRange("pathMm", pathMm, pathMm >= 0);
  return pathMm * Math.tan((walkOffDeg({ omega, epsilon }) * Math.PI) / 180);
}
