import type { Score, Term } from "./term.ts";

/** Colour, pleochroism, glow and spectrum are subjective and hang together: they count with half their weight (formulas §10.6). */
export const half = 0.5;
/** A share too small to be usual and too large to contradict: words are chosen by eye. */
const seldom = 0.02;

/** What all observations that are seen rather than measured have in common; `unlisted`: their probability for an unlisted material. */
export function seenTerm(property: string, observed: string, unlisted: number, exponent = 1): Omit<Term, "score" | "reference"> {
  return { property, observed, isIndex: false, measure: null, unlistedLogLikelihood: exponent * Math.log(unlisted), contradiction: () => `${observed} is not known of it` };
}

/** @param tail what the verdict goes by; the probability itself where left out */
export function probable(probability: number, exponent = 1, tail = probability): Score {
  return { logLikelihood: exponent * Math.log(probability), tail, distance: 0 };
}

/** A probability and, for its verdict, how it compares with the likeliest thing that could have been seen: seldom at worst. */
export function beside(probability: number, likeliest: number, exponent = 1): Score {
  return probable(probability, exponent, Math.max(seldom, probability / likeliest));
}

export const summary = (words: readonly string[]) => [...new Set(words)].slice(0, 8).join(", ") || "not known";
