import { requireRange } from "../require-range.ts";

/**
 * Index of the second medium from the angles of a ray on both sides of a plane boundary.
 *
 * @param n1 index of the first medium, in [1, 4]
 * @param incidenceDeg angle from the normal in the first medium, degrees, in (0, 90]
 * @param refractionDeg angle from the normal in the second medium, degrees, in (0, 90]
 * @returns index of the second medium, unrounded
 * @throws RangeError when an argument leaves its range, or the index would fall below 1 or above 4: one of the angles is wrong
 *
 * Source: Snell's law, standard optics.
 * @example indexFromRefraction({ n1: 1, incidenceDeg: 45, refractionDeg: 27.251 }) // ≈ 1.5443
 */
export function indexFromRefraction({ n1, incidenceDeg, refractionDeg }: { n1: number; incidenceDeg: number; refractionDeg: number }): number {
  requireRange("n1", n1, n1 >= 1 && n1 <= 4);
  requireRange("incidenceDeg", incidenceDeg, incidenceDeg > 0 && incidenceDeg <= 90);
  requireRange("refractionDeg", refractionDeg, refractionDeg > 0 && refractionDeg <= 90);
  const n2 = (n1 * Math.sin((incidenceDeg * Math.PI) / 180)) / Math.sin((refractionDeg * Math.PI) / 180);
  requireRange("n2", n2, n2 >= 1 && n2 <= 4);
  return n2;
}
