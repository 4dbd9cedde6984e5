import { requireRange } from "../require-range.ts";

/**
 * Index of a polished face from its Brewster angle. A film of oil, absorption and the direction of an anisotropic stone
 * bias it beyond the uncertainty.
 *
 * @param brewsterDeg angle of incidence at which the reflection is least, degrees, in (0, 90)
 * @param uBrewsterDeg standard uncertainty of the angle, degrees, ≥ 0
 * @param nOutside index on the side of the incident light, in [1, 4]; air is 1
 * @returns the index and its standard uncertainty, dimensionless, unrounded
 * @throws RangeError when an argument leaves its range, or the index would fall below 1 or above 4
 *
 * Source: n = tan θ_B, standard optics; dn/dθ = 1 + n² by differentiation, JCGM 100:2008, 5.1.2. The usual uncertainty of
 * an angle, 0.3°, is common practice. Such instruments use a laser: never look into it or its reflection.
 * @example indexFromBrewsterAngle({ brewsterDeg: 67.52 }).n // ≈ 2.417
 */
export function indexFromBrewsterAngle({ brewsterDeg, uBrewsterDeg = 0.3, nOutside = 1 }: { brewsterDeg: number; uBrewsterDeg?: number; nOutside?: number }): { n: number; u: number } {
  requireRange("brewsterDeg", brewsterDeg, brewsterDeg > 0 && brewsterDeg < 90);
  requireRange("uBrewsterDeg", uBrewsterDeg, uBrewsterDeg >= 0);
  requireRange("nOutside", nOutside, nOutside >= 1 && nOutside <= 4);
  const tangent = Math.tan((brewsterDeg * Math.PI) / 180);
  const n = nOutside * tangent;
  requireRange("n", n, n >= 1 && n <= 4);
  return { n, u: nOutside * (1 + tangent ** 2) * ((uBrewsterDeg * Math.PI) / 180) };
}
