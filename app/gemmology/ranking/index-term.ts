import { blunderShares, span } from "./defaults.ts";
import type { ReadingGrade } from "./evidence.ts";
import { hull, outOfRange, written } from "./form-ranges.ts";
import type { Score, Term } from "./term.ts";

/** A form without an index shows one only by mistake. */
export const opaque: Score = { logLikelihood: Math.log(blunderShares.good / span.index), tail: 0, distance: 0 };
/** An aggregate whose grains happen to show two edges (house value). */
export const twoEdgesOnAggregateShare = 0.1;

/** What all readings of an index have in common. */
export function indexTerm(property: string, observed: string, quality: ReadingGrade = "good"): Omit<Term, "score"> {
  return {
    property,
    observed,
    isIndex: true,
    measure: { noun: "index", decimals: 3 },
    unlistedLogLikelihood: Math.log(1 / span.index),
    cannotContradict: quality !== "good",
    reference: (forms) => written(forms.flatMap((form) => { const range = hull(form); return range ? [range] : []; }), 3) || "no index can be read",
    contradiction: (form, { distance }) => (!hull(form) ? "opaque and metallic: it gives no index" : distance === 0 ? "its edges do not go with that" : outOfRange("index", distance)),
  };
}
