import { colourFamilies, colourFamiliesOf } from "./colour-families.ts";

/** Colour words as bits, one a family in the families' order; 0 where no family is named. */
export function colourMask(words: string | null | undefined): number {
  return words ? colourFamiliesOf([words]).reduce((mask, family) => mask | (1 << colourFamilies.indexOf(family)), 0) : 0;
}

/** How many families two masks share. */
export function sharedColours(a: number, b: number): number {
  let count = 0;
  for (let left = a & b; left !== 0; left &= left - 1) count++;
  return count;
}
