import { requireRange } from "../require-range.ts";
import { cauchyIndex, cauchyThrough } from "./cauchy.ts";
import { lineBNm, lineGNm, sodiumNm } from "./dispersion-interval.ts";

/**
 * A reading in other light brought to 589.3 nm for a candidate whose dispersion is known, by Cauchy's formula with that
 * dispersion between B and G.
 *
 * @param n as read at `nm`
 * @param dispersionBG index at G less index at B of the candidate
 * @throws RangeError outside 400 to 700 nm
 *
 * Source: Cauchy's formula; within 0.0005 of the formula of diamond between 486 and 656 nm.
 */
export function indexAtSodium({ n, nm, dispersionBG }: { n: number; nm: number; dispersionBG: number }): number {
  requireRange("nm", nm, nm >= 400 && nm <= 700);
  requireRange("dispersionBG", dispersionBG, dispersionBG >= 0 && dispersionBG < 0.5);
  const { b } = cauchyThrough({ nm: lineGNm, n: dispersionBG }, { nm: lineBNm, n: 0 });
  return n - cauchyIndex({ a: 0, b }, nm) + cauchyIndex({ a: 0, b }, sodiumNm);
}
