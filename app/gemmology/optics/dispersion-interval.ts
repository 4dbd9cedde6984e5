import { indexAtWavelength, type DispersionFormula } from "./index-at-wavelength.ts";

/** Fraunhofer's lines B and G, and the light of sodium, in nanometres. */
export const lineBNm = 686.7;
export const lineGNm = 430.8;
export const sodiumNm = 589.3;

/** The gem trade's measure of fire: index at G less index at B. @throws RangeError where the formula does not reach both */
export function dispersionInterval(formula: DispersionFormula): number {
  return indexAtWavelength(formula, lineGNm) - indexAtWavelength(formula, lineBNm);
}
