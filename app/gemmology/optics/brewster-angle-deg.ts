import { requireRange } from "../require-range.ts";

/**
 * Angle of incidence, in degrees, at which the reflected light is wholly polarised.
 *
 *   tan θ_B = n / n_outside
 *
 * @param n index of the stone, isotropic and transparent, 1 to 4
 * @param nOutside index of what the light comes from
 * @throws RangeError
 *
 * Source: Fresnel's equations (Brewster 1815).
 */
export function brewsterAngleDeg(n: number, nOutside = 1): number {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("nOutside", nOutside, nOutside >= 1 && nOutside <= 4);
  return (Math.atan(n / nOutside) * 180) / Math.PI;
}
