import { requireRange } from "../require-range.ts";

/**
 * Index from the share of light that one polished surface throws back at normal incidence in air.
 *
 *   n = (1 + √R) / (1 − √R),   dn/dR = 1 / (√R (1 − √R)²)
 *
 * Holds for a transparent stone without a coating.
 *
 * @param reflectance R, above 0 and below 0.4
 * @param u its standard uncertainty
 * @throws RangeError
 *
 * Source: Fresnel's equations; propagation by JCGM 100:2008.
 */
export function indexFromReflectance({ reflectance, u = 0.005 }: { reflectance: number; u?: number }): { n: number; u: number } {
  requireRange("reflectance", reflectance, reflectance > 0 && reflectance < 0.4);
  requireRange("u", u, u >= 0);
  const root = Math.sqrt(reflectance);
  return { n: (1 + root) / (1 - root), u: u / (root * (1 - root) ** 2) };
}
