import { requireRange } from "../require-range.ts";

/**
 * Angle of refraction at a plane boundary between two isotropic media.
 *
 * @param n1 index of the first medium, in [1, 4]
 * @param n2 index of the second medium, in [1, 4]
 * @param incidenceDeg angle of incidence from the normal, degrees, in [0, 90]
 * @returns angle from the normal in the second medium, degrees; null for total reflection
 * @throws RangeError when an argument leaves its range
 *
 * Source: Snell's law, standard optics.
 * @example refractionAngleDeg({ n1: 1, n2: 1.5443, incidenceDeg: 45 }) // ≈ 27.251
 */
export function refractionAngleDeg({ n1, n2, incidenceDeg }: { n1: number; n2: number; incidenceDeg: number }): number | null {
  requireRange("n1", n1, n1 >= 1 && n1 <= 4);
  requireRange("n2", n2, n2 >= 1 && n2 <= 4);
  requireRange("incidenceDeg", incidenceDeg, incidenceDeg >= 0 && incidenceDeg <= 90);
  const sine = (n1 / n2) * Math.sin((incidenceDeg * Math.PI) / 180);
  return sine > 1 ? null : (Math.asin(sine) * 180) / Math.PI;
}
