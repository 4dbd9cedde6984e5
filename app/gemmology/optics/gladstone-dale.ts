import { requireRange } from "../require-range.ts";

export type Compatibility = "superior" | "excellent" | "good" | "fair" | "poor";
/** Largest |1 − K_P/K_C| of each class (Mandarino, Canadian Mineralogist 19 (1981) 441, as summarised on a public page). */
const classes: readonly (readonly [most: number, compatibility: Compatibility])[] = [[0.019, "superior"], [0.039, "excellent"], [0.059, "good"], [0.079, "fair"]];

/**
 * Specific refractive energy by physics, K_P = (n̄ − 1)/ρ.
 *
 * @param meanIndex (2ω + ε)/3 or (α + β + γ)/3, in [1, 4]
 * @param densityGCm3 g/cm³, > 0
 * @throws RangeError when an argument leaves its range
 *
 * Source: J. H. Gladstone and T. P. Dale, Phil. Trans. 153 (1863) 317.
 * @example refractiveEnergyByPhysics({ meanIndex: 1.5473, densityGCm3: 2.65 }) // ≈ 0.2065, quartz
 */
export function refractiveEnergyByPhysics({ meanIndex, densityGCm3 }: { meanIndex: number; densityGCm3: number }): number {
  requireRange("meanIndex", meanIndex, meanIndex >= 1 && meanIndex <= 4);
  requireRange("densityGCm3", densityGCm3, densityGCm3 > 0);
  return (meanIndex - 1) / densityGCm3;
}

/**
 * Specific refractive energy by composition, K_C = Σ kᵢ wᵢ.
 *
 * @param parts each constituent's constant (cm³/g, > 0) and mass fraction (0 to 1); the fractions sum to 1 within 0.02
 * @throws RangeError when a value leaves its range
 *
 * Source: as above; the constants are the caller's and carry their own source.
 */
export function refractiveEnergyByComposition(parts: readonly Readonly<{ constant: number; massFraction: number }>[]): number {
  for (const { constant, massFraction } of parts) {
    requireRange("constant", constant, constant > 0);
    requireRange("massFraction", massFraction, massFraction >= 0 && massFraction <= 1);
  }
  const whole = parts.reduce((sum, { massFraction }) => sum + massFraction, 0);
  requireRange("sum of massFraction", whole, Math.abs(whole - 1) <= 0.02);
  return parts.reduce((sum, { constant, massFraction }) => sum + constant * massFraction, 0) / whole;
}

/**
 * How well index, density and composition go together. A check of plausibility, good to some five per cent: it does not
 * identify.
 *
 * @param byPhysics, byComposition specific refractive energies, cm³/g, > 0
 * @returns 1 − K_P/K_C, signed, and its class
 * @throws RangeError when an argument leaves its range
 *
 * Source: J. A. Mandarino, Canadian Mineralogist 19 (1981) 441.
 */
export function gladstoneDaleCompatibility({ byPhysics, byComposition }: { byPhysics: number; byComposition: number }): Readonly<{ index: number; compatibility: Compatibility }> {
  requireRange("byPhysics", byPhysics, byPhysics > 0);
  requireRange("byComposition", byComposition, byComposition > 0);
  const index = 1 - byPhysics / byComposition;
  // Published classes have three decimals; what rounds to a limit belongs to it.
  const size = Math.round(Math.abs(index) * 1000) / 1000;
  return { index, compatibility: classes.find(([most]) => size <= most)?.[1] ?? "poor" };
}
