import type { DispersionFormula } from "./dispersion-formula.ts";
import { indexAtWavelength } from "./index-at-wavelength.ts";
import { fraunhoferBNm, fraunhoferGNm } from "./wavelengths.ts";

/**
 * Dispersion as the trade gives it: index at Fraunhofer's G (430.8 nm) less that at B (686.7 nm).
 *
 * @returns dimensionless, unrounded
 * @throws RangeError when the formula does not reach both lines
 *
 * Source: definition, standard gemmology.
 * @example dispersionBG(diamond) // ≈ 0.044
 */
export function dispersionBG(formula: DispersionFormula): number {
  return indexAtWavelength(formula, fraunhoferGNm) - indexAtWavelength(formula, fraunhoferBNm);
}
