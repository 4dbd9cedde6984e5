import { requireRange } from "../require-range.ts";

/**
 * Index of a facet from the angle of its shadow edge in a refractometer's prism.
 *
 * @param angleDeg critical angle against the prism, degrees from the normal, in (0, 90)
 * @param prismN index of the prism at the wavelength of the reading, in (1, 4]
 * @param uAngleDeg standard uncertainty of the angle, degrees, ≥ 0
 * @param uPrismN standard uncertainty of the prism's index, ≥ 0
 * @returns the index and its standard uncertainty, dimensionless, unrounded
 * @throws RangeError when an argument leaves its range, or the index would fall below 1
 *
 * Source: n = n_p·sin θ, standard optics (a plane-parallel film of liquid cancels); propagation by JCGM 100:2008, 5.1.2.
 * @example indexFromCriticalAngle({ angleDeg: 55.227, prismN: 1.88 }).n // ≈ 1.5443
 */
export function indexFromCriticalAngle({ angleDeg, prismN, uAngleDeg = 0.03, uPrismN = 0.0005 }: { angleDeg: number; prismN: number; uAngleDeg?: number; uPrismN?: number }): { n: number; u: number } {
  requireRange("angleDeg", angleDeg, angleDeg > 0 && angleDeg < 90);
  requireRange("prismN", prismN, prismN > 1 && prismN <= 4);
  requireRange("uAngleDeg", uAngleDeg, uAngleDeg >= 0);
  requireRange("uPrismN", uPrismN, uPrismN >= 0);
  const theta = (angleDeg * Math.PI) / 180;
  const n = prismN * Math.sin(theta);
  requireRange("n", n, n >= 1);
  return { n, u: Math.hypot(prismN * Math.cos(theta) * ((uAngleDeg * Math.PI) / 180), Math.sin(theta) * uPrismN) };
}
