import type { DispersionFormula } from "./dispersion-formula.ts";
import { indexAtWavelength } from "./index-at-wavelength.ts";
import { fraunhoferCNm, fraunhoferFNm, sodiumNm } from "./wavelengths.ts";

/**
 * Abbe's number as optics gives dispersion: (n − 1) in sodium light over the difference of the indices at F and C.
 *
 * @returns dimensionless, larger for less dispersion, unrounded
 * @throws RangeError when the formula does not reach the three lines
 *
 * Source: definition, standard optics (there often for the helium d line, 587.6 nm, which changes the last digit).
 * @example abbeNumber(diamond) // ≈ 55.3
 */
export function abbeNumber(formula: DispersionFormula): number {
  return (indexAtWavelength(formula, sodiumNm) - 1) / (indexAtWavelength(formula, fraunhoferFNm) - indexAtWavelength(formula, fraunhoferCNm));
}
