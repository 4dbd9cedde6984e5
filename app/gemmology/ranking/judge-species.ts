import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { SpeciesForm, SpeciesNode } from "../species/species-table.ts";
import { compositionGain } from "./composition-gain.ts";
import { contradicts, independentKind } from "./contradicts.ts";
import { sharedOffsetGain } from "./shared-offset-gain.ts";
import type { Score, Term } from "./term.ts";

/** Standard uncertainties beyond which nothing but a blunder explains a reading. */
const farOut = 8;

/** The observations with what is the same for every species. */
export type Plan = Readonly<{ terms: readonly Term[]; kinds: readonly string[]; indices: readonly number[]; densities: readonly number[] }>;

export function planOf(terms: readonly Term[]): Plan {
  const at = (is: (term: Term) => boolean) => terms.flatMap((term, index) => (is(term) ? [index] : []));
  return { terms, kinds: terms.map(independentKind), indices: at(({ isIndex }) => isIndex), densities: at(({ property }) => property === "sg") };
}

export type Judged = Readonly<{
  logLikelihood: number;
  /** The form that fits best, with its scores. */
  best: SpeciesForm;
  bestScores: readonly Score[];
  /** Two independent observations contradict every form. */
  isContradicted: boolean;
}>;

/** A species is the mixture of its forms; it is contradicted when every one of them is. Written in loops: every stone meets some three hundred forms. */
export function judgeSpecies({ forms }: SpeciesNode, plan: Plan): Judged {
  let best = forms[0]!;
  let bestScores: Score[] = [];
  let bestLog = -Infinity;
  let isOpen = false;
  const logs: number[] = [];
  for (const form of forms) {
    const scores: Score[] = [];
    let log = 0;
    for (const term of plan.terms) {
      const score = term.score(form, 0);
      scores.push(score);
      log += score.logLikelihood;
    }
    log += jointGain(form, plan, scores);
    logs.push(Math.log(form.share) + log);
    const isAgainst = isTwiceContradicted(plan, scores);
    if (isAgainst ? isOpen || log <= bestLog : isOpen && log <= bestLog) continue;
    best = form;
    bestScores = scores;
    bestLog = log;
    isOpen = !isAgainst;
  }
  return { logLikelihood: logSumExp(logs), best, bestScores, isContradicted: !isOpen };
}

/**
 * What readings gain that belong together. One that lies far out belongs to none of them: neither a shared error nor a
 * composition brings it back, and the others stay together without it, so that it cannot raise a form.
 */
function jointGain(form: SpeciesForm, { terms, indices, densities }: Plan, scores: readonly Score[]): number {
  if (indices.length < (form.isSeries && densities.length > 0 ? 1 : 2)) return 0;
  const together: Term[] = [];
  let separate = 0;
  const gather = (from: readonly number[]) => {
    for (const index of from) {
      const { distance, logLikelihood } = scores[index]!;
      if (distance >= farOut || distance <= -farOut) continue;
      together.push(terms[index]!);
      separate += logLikelihood;
    }
  };
  gather(indices);
  const indexCount = together.length;
  if (indexCount === 0) return 0;
  if (form.isSeries) gather(densities);
  if (together.length > indexCount) return compositionGain(form, together, separate);
  return indexCount > 1 ? sharedOffsetGain(form, together, separate) : 0;
}

function isTwiceContradicted({ terms, kinds }: Plan, scores: readonly Score[]): boolean {
  let first: string | null = null;
  for (let index = 0; index < terms.length; index++) {
    if (!contradicts(terms[index]!, scores[index]!)) continue;
    if (first !== null && kinds[index] !== first) return true;
    first = kinds[index]!;
  }
  return false;
}

/** Why a species is contradicted: the strongest contradiction, and the strongest of another kind. */
export function whyContradicted({ best, bestScores }: Judged, { terms, kinds }: Plan): string {
  let [first, second] = [-1, -1];
  for (const isSecond of [false, true]) {
    for (let index = 0; index < terms.length; index++) {
      if (!contradicts(terms[index]!, bestScores[index]!) || (isSecond && kinds[index] === kinds[first])) continue;
      const strongest = isSecond ? second : first;
      if (strongest >= 0 && strength(strongest, bestScores, terms) <= strength(index, bestScores, terms)) continue;
      if (isSecond) second = index;
      else first = index;
    }
  }
  return [first, second].flatMap((index) => (index >= 0 ? [terms[index]!.contradiction(best, bestScores[index]!)] : [])).join("; ");
}

/** The less, the more an observation speaks against a form beside an unlisted material. */
function strength(index: number, scores: readonly Score[], terms: readonly Term[]): number {
  return scores[index]!.logLikelihood - terms[index]!.unlistedLogLikelihood;
}
