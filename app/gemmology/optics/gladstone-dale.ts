import { requireRange } from "../require-range.ts";

export type Compatibility = "superior" | "excellent" | "good" | "fair" | "poor";

/** Specific refractivity of a mineral: K_P = (n̄ − 1)/ρ, with ρ in g/cm³. @throws RangeError */
export function specificRefractivity({ meanIndex, densityGCm3 }: { meanIndex: number; densityGCm3: number }): number {
  requireRange("meanIndex", meanIndex, meanIndex > 1 && meanIndex < 4);
  requireRange("densityGCm3", densityGCm3, densityGCm3 > 0.5 && densityGCm3 < 25);
  return (meanIndex - 1) / densityGCm3;
}

/**
 * Whether index and density of a mineral fit its composition: 1 − K_P/K_C, with K_C the sum of the oxides' constants by
 * mass. A check of plausibility, not of identity.
 *
 * Source: Gladstone and Dale, Phil. Trans. 153 (1863) 317; classes after Mandarino, Can. Mineral. 19 (1981) 441.
 */
export function gladstoneDale({ kPhysical, kChemical }: { kPhysical: number; kChemical: number }): { deviation: number; compatibility: Compatibility } {
  requireRange("kPhysical", kPhysical, kPhysical > 0 && kPhysical < 1);
  requireRange("kChemical", kChemical, kChemical > 0 && kChemical < 1);
  const deviation = 1 - kPhysical / kChemical;
  const size = Math.abs(deviation);
  return { deviation, compatibility: size <= 0.019 ? "superior" : size <= 0.039 ? "excellent" : size <= 0.059 ? "good" : size <= 0.079 ? "fair" : "poor" };
}
