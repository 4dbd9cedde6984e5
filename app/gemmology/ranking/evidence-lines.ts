import type { SpeciesForm, SpeciesNode } from "../species/species-table.ts";
import { contradicts } from "./contradicts.ts";
import { verdictAt } from "./defaults.ts";
import type { Judged } from "./judge-species.ts";
import type { EvidenceLine, Verdict } from "./ranking.ts";
import type { Score, Term } from "./term.ts";

/** Every observation with how a species stands to it, in words. */
export function evidenceLines(node: SpeciesNode, { best, bestScores }: Pick<Judged, "best" | "bestScores">, terms: readonly Term[]): EvidenceLine[] {
  const known = referencesOf(node);
  const lines: EvidenceLine[] = [];
  for (let index = 0; index < terms.length; index++) {
    const term = terms[index]!;
    const score = bestScores[index]!;
    const verdict = verdictOf(term, score);
    let reference = known.get(term.property);
    if (reference === undefined) known.set(term.property, (reference = term.reference(node.forms)));
    lines.push({ property: term.property, observed: term.observed, reference, logLikelihood: score.logLikelihood, verdict, because: because(term, best, score, verdict) });
  }
  return lines;
}

/** What the table says of a species in words does not depend on the stone. */
const references = new WeakMap<SpeciesNode, Map<string, string>>();

function referencesOf(node: SpeciesNode): Map<string, string> {
  let known = references.get(node);
  if (!known) references.set(node, (known = new Map()));
  return known;
}

function verdictOf(term: Term, score: Score): Verdict {
  if (contradicts(term, score)) return "contradicts";
  return score.tail < (term.measure ? verdictAt.strained : 0.1) ? "strained" : "agrees";
}

function because(term: Term, form: SpeciesForm, score: Score, verdict: Verdict): string {
  if (verdict === "contradicts") return term.contradiction(form, score);
  if (term.explain) return term.explain(form);
  if (!term.measure) return verdict === "agrees" ? "as known of it" : "seldom seen of it";
  if (score.distance === 0) return "inside its range";
  const side = score.distance > 0 ? "above" : "below";
  const times = Math.abs(score.distance).toFixed(1);
  return verdict === "agrees" ? `just ${side} its range, within the uncertainty` : `${times} standard uncertainties ${side} its range`;
}
