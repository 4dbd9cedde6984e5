import { requireRange } from "../require-range.ts";

/** A published dispersion formula; the numbers mean what its type says, with wavelengths in micrometres. */
export type DispersionFormula = Readonly<{ formulaType: string; coefficients: readonly number[]; rangeUm: readonly number[] }>;

/**
 * Index at a wavelength by a published formula.
 *
 *   formula 1 (Sellmeier)   n² − 1 = c₁ + Σ b L²/(L² − c²)
 *   formula 2 (Sellmeier)   n² − 1 = c₁ + Σ b L²/(L² − c)
 *   formula 4               n² = c₁ + b₁ L^e₁/(L² − d₁^f₁) + b₂ L^e₂/(L² − d₂^f₂) + Σ b L^c
 *
 * @param nm wavelength in nanometres
 * @throws RangeError outside the formula's range, or for a type that is not there
 *
 * Source: each formula's own, kept beside its numbers.
 */
export function indexAtWavelength({ formulaType, coefficients, rangeUm }: DispersionFormula, nm: number): number {
  const L = nm / 1000;
  requireRange("nm", nm, L >= rangeUm[0]! && L <= rangeUm[1]!);
  const [first = 0, ...rest] = coefficients;
  const pairs = (from: readonly number[]) => Array.from({ length: Math.floor(from.length / 2) }, (_, at) => [from[2 * at]!, from[2 * at + 1]!] as const);
  const sum = (terms: readonly number[]) => terms.reduce((total, term) => total + term, 0);
  switch (formulaType) {
    case "formula 1":
      return Math.sqrt(1 + first + sum(pairs(rest).map(([b, c]) => (b * L ** 2) / (L ** 2 - c ** 2))));
    case "formula 2":
      return Math.sqrt(1 + first + sum(pairs(rest).map(([b, c]) => (b * L ** 2) / (L ** 2 - c))));
    case "formula 4": {
      const [b1 = 0, e1 = 0, d1 = 0, f1 = 1, b2 = 0, e2 = 0, d2 = 0, f2 = 1, ...others] = rest;
      const term = (b: number, e: number, d: number, f: number) => (b === 0 ? 0 : (b * L ** e) / (L ** 2 - d ** f));
      return Math.sqrt(first + term(b1, e1, d1, f1) + term(b2, e2, d2, f2) + sum(pairs(others).map(([b, c]) => b * L ** c)));
    }
    default:
      throw new RangeError(`formulaType out of range: ${formulaType}`);
  }
}
