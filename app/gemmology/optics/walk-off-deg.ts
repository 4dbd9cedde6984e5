import { requireRange } from "../require-range.ts";

/**
 * Largest angle, in degrees, between the two rays of a uniaxial crystal for one wave normal.
 *
 *   tan ρ = |ε² − ω²| / (2 ε ω)
 *
 * @throws RangeError
 *
 * Source: crystal optics (Born and Wolf, Principles of Optics, §15.3).
 */
export function walkOffDeg({ omega, epsilon }: { omega: number; epsilon: number }): number {
  requireRange("omega", omega, omega >= 1 && omega <= 4);
  requireRange("epsilon", epsilon, epsilon >= 1 && epsilon <= 4);
  return (Math.atan(Math.abs(epsilon ** 2 - omega ** 2) / (2 * epsilon * omega)) * 180) / Math.PI;
}
