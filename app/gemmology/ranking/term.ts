import type { SpeciesForm } from "../species/species-table.ts";

/** How one form stands to one observation. */
export type Score = Readonly<{
  logLikelihood: number;
  /** Predictive probability of something at least as far out; 1 where that has no meaning. */
  tail: number;
  /** How far the reading lies outside the form's range, in standard uncertainties with the table's softness; signed, 0 inside. */
  distance: number;
}>;

/** One observation, ready to be held against any form. */
export type Term = Readonly<{
  property: string;
  observed: string;
  /** What an unlisted material would be given. */
  unlistedLogLikelihood: number;
  score: (form: SpeciesForm, indexOffset: number) => Score;
  /** The species' range in words, over the forms given. */
  reference: (forms: readonly SpeciesForm[]) => string;
  /** Moves with the error that all index readings share. */
  isIndex: boolean;
  /** The unit's name and the decimals to write it with; none for what is seen. */
  measure: Readonly<{ noun: string; decimals: number }> | null;
  /** A reading that could not be taken well strains a species, and never contradicts it. */
  cannotContradict?: boolean;
  /** What the observation says when nothing fits, for species that it contradicts. */
  contradiction: (form: SpeciesForm, score: Score) => string;
  /** The reason in words, where the score alone does not give it. */
  explain?: (form: SpeciesForm) => string;
}>;
