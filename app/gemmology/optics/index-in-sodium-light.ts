import { requireRange } from "../require-range.ts";
import type { DispersionFormula } from "./dispersion-formula.ts";
import { indexAtWavelength } from "./index-at-wavelength.ts";
import { fraunhoferBNm, fraunhoferGNm, sodiumNm } from "./wavelengths.ts";

/** A candidate's dispersion: its B–G interval, or its formula. */
export type CandidateDispersion = Readonly<{ dispersionBG: number; uDispersionBG?: number }> | DispersionFormula;

/** Share of the shift by which two terms of Cauchy's formula are off, as a standard uncertainty. */
const cauchyShare = 0.1;

/**
 * What an index that was read at another wavelength would be in sodium light, if the stone were a candidate whose
 * dispersion is known. It is the candidate's index, not the stone's: another candidate gives another.
 *
 * @param n index as read, in [1, 4]
 * @param u standard uncertainty of it, ≥ 0
 * @param nm wavelength of the reading in air, nm, in [400, 780]
 * @param dispersion of the candidate, B–G in [0, 0.6]
 * @returns the index at 589.3 nm and its standard uncertainty, unrounded; that of the shift is within it
 * @throws RangeError when an argument leaves its range
 *
 * Source: Cauchy's formula in two terms, its slope from the B–G interval; or the difference of the candidate's formula. The
 * two terms are off by up to a quarter of the shift against published formulas of gem materials (tests).
 * @example indexInSodiumLight({ n: 1.7564, u: 0.001, nm: 660, dispersion: { dispersionBG: 0.018 } }).n // ≈ 1.760
 */
export function indexInSodiumLight({ n, u, nm, dispersion }: { n: number; u: number; nm: number; dispersion: CandidateDispersion }): { n: number; u: number } {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("u", u, u >= 0);
  requireRange("nm", nm, nm >= 400 && nm <= 780);
  if ("kind" in dispersion) return { n: n + indexAtWavelength(dispersion, sodiumNm) - indexAtWavelength(dispersion, nm), u };
  const { dispersionBG, uDispersionBG = 0 } = dispersion;
  requireRange("dispersionBG", dispersionBG, dispersionBG >= 0 && dispersionBG <= 0.6);
  requireRange("uDispersionBG", uDispersionBG, uDispersionBG >= 0);
  const perBG = (sodiumNm ** -2 - nm ** -2) / (fraunhoferGNm ** -2 - fraunhoferBNm ** -2);
  return { n: n + perBG * dispersionBG, u: Math.hypot(u, perBG * uDispersionBG, cauchyShare * perBG * dispersionBG) };
}
