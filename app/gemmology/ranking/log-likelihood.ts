import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { SpeciesNode } from "../species/species-table.ts";
import type { Evidence } from "./evidence.ts";
import type { Term } from "./term.ts";
import { termsOf } from "./terms-of.ts";

/** Logarithm of how likely a species shows such evidence: the mixture of its forms, every observation by itself. */
export function logLikelihood(node: SpeciesNode, evidence: Evidence | readonly Term[]): number {
  const terms = isTerms(evidence) ? evidence : termsOf(evidence);
  return logSumExp(node.forms.map((form) => terms.reduce((sum, term) => sum + term.score(form, 0).logLikelihood, Math.log(form.share))));
}

const isTerms = (evidence: Evidence | readonly Term[]): evidence is readonly Term[] => Array.isArray(evidence);
