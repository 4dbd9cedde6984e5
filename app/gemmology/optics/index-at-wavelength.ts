import { requireRange } from "../require-range.ts";
import type { DispersionFormula } from "./dispersion-formula.ts";

/**
 * Index of a material at a wavelength, by its dispersion formula.
 *
 * @param nm wavelength in air, nm, within the formula's range
 * @returns the index, unrounded
 * @throws RangeError when the wavelength leaves the formula's range, or the formula gives no index above 1 there
 *
 * Source: W. Sellmeier, Annalen der Physik 219 (1871) 272; A. L. Cauchy's formula as in standard optics; a cubic by
 * Lagrange for tables. Coefficients are the caller's and carry their own source.
 * @example indexAtWavelength({ kind: "sellmeier", fromNm: 226, toNm: 760, constant: 1, terms: [{ strength: 0.3306, pole: 0.175 ** 2 }, { strength: 4.3356, pole: 0.106 ** 2 }] }, 589.3) // ≈ 2.4173, diamond
 */
export function indexAtWavelength(formula: DispersionFormula, nm: number): number {
  requireRange("nm", nm, nm >= formula.fromNm && nm <= formula.toNm);
  const n = indexBy(formula, nm);
  requireRange(`n at ${nm} nm`, n, n >= 1);
  return n;
}

function indexBy(formula: DispersionFormula, nm: number): number {
  const um = nm / 1000;
  const square = um * um;
  switch (formula.kind) {
    case "sellmeier":
      return Math.sqrt(formula.terms.reduce((sum, { strength, pole }) => sum + (strength * square) / (square - pole), formula.constant));
    case "cauchy":
      return formula.a + formula.b / square;
    case "powers": {
      const resonant = formula.resonances.reduce((sum, { strength, power, pole }) => sum + (strength * um ** power) / (square - pole), formula.constant);
      return Math.sqrt(formula.powers.reduce((sum, { strength, power }) => sum + strength * um ** power, resonant));
    }
    case "table":
      return cubicThrough(formula.points, nm);
  }
}

function cubicThrough(points: Extract<DispersionFormula, { kind: "table" }>["points"], nm: number): number {
  requireRange("points of the table", points.length, points.length >= 4);
  const next = points.findIndex((point) => point.nm >= nm);
  const first = Math.min(Math.max(next - 2, 0), points.length - 4);
  const four = points.slice(first, first + 4);
  return four.reduce((sum, { nm: at, n }) => sum + four.reduce((weight, other) => (other.nm === at ? weight : (weight * (nm - other.nm)) / (at - other.nm)), n), 0);
}
