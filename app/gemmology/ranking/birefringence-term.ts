import { blunderShares, defaultU, softness, span } from "./defaults.ts";
import type { ReadingGrade } from "./evidence.ts";
import { outOfRange, written } from "./form-ranges.ts";
import { numericScore } from "./numeric-score.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { Score, Term } from "./term.ts";

/** Edges of one facet share most of their error: their difference is read better than either (instruments' notes). */
export const differenceU = (u: number) => u * (defaultU.birefringence / defaultU.edge);

/** Birefringence by itself. */
export function birefringenceTerm({ value, u = defaultU.birefringence, quality = "good" }: { value: number; u?: number; quality?: ReadingGrade }): Term {
  return {
    property: "birefringence",
    observed: value.toFixed(3),
    isIndex: false,
    measure: { noun: "birefringence", decimals: 3 },
    unlistedLogLikelihood: Math.log(1 / span.birefringence),
    cannotContradict: quality !== "good",
    score: (form) => birefringenceScore(form, { value, u, quality }),
    reference: (forms) => written(forms.flatMap(({ birefringence }) => (birefringence ? [birefringence] : [])), 3) || "not observed on aggregates",
    contradiction: (form, { distance }) => (form.birefringence?.[1] === 0 ? "singly refractive, the stone is not" : outOfRange("birefringence", distance)),
  };
}

/** An aggregate shows no birefringence of its own: mostly one edge, and what else was read says little about it (house value). */
const oneEdgeOnAggregateShare = 0.8;
const onAggregate: Score = { logLikelihood: Math.log((1 - oneEdgeOnAggregateShare) / span.birefringence), tail: 1, distance: 0 };

export function birefringenceScore(form: SpeciesForm, { value, u, quality }: { value: number; u: number; quality: ReadingGrade }): Score {
  if (!form.birefringence && value > 2 * u) return onAggregate;
  if (!form.birefringence) {
    const { logLikelihood } = numericScore({ value, u, range: [0, 0], softness: softness.birefringence, span: span.birefringence, blunderShare: blunderShares[quality] });
    return { logLikelihood: logLikelihood + Math.log(oneEdgeOnAggregateShare), tail: 1, distance: 0 };
  }
  return numericScore({ value, u, range: form.birefringence, usual: form.usual.birefringence, softness: softness.birefringence, span: span.birefringence, blunderShare: blunderShares[quality] });
}
