import { requireRange } from "../require-range.ts";
import { refractionAngleDeg } from "./refraction-angle-deg.ts";

/**
 * Angle at which a ray leaves the second face of a prism (two facets of a stone are one), in the plane across its edge.
 *
 * @param n index at the ray's wavelength, in [1, 4]
 * @param apexDeg angle between the faces, degrees, in (0, 90]
 * @param incidenceDeg angle from the first face's normal, on the side away from the apex, degrees, in [0, 90]
 * @returns angle from the second face's normal, degrees, positive away from the apex; null where it is totally reflected
 * @throws RangeError when an argument leaves its range
 *
 * Source: Snell's law at both faces, standard optics.
 * @example prismExitDeg({ n: 1.512, apexDeg: 60, incidenceDeg: 45 }) // ≈ 53.5
 */
export function prismExitDeg({ n, apexDeg, incidenceDeg }: { n: number; apexDeg: number; incidenceDeg: number }): number | null {
  requireRange("apexDeg", apexDeg, apexDeg > 0 && apexDeg <= 90);
  const inside = refractionAngleDeg({ n1: 1, n2: n, incidenceDeg })!;
  const onSecond = apexDeg - inside;
  const exit = refractionAngleDeg({ n1: n, n2: 1, incidenceDeg: Math.abs(onSecond) });
  return exit === null ? null : Math.sign(onSecond) * exit;
}
