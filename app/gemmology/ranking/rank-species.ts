import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { Lookalike, SpeciesTable } from "../species/species-table.ts";
import { compareIds } from "./compare-ids.ts";
import { modelVersion, priorFloor, unlistedPrior } from "./defaults.ts";
import type { Evidence } from "./evidence.ts";
import { evidenceLines } from "./evidence-lines.ts";
import { judgeSpecies, planOf, whyContradicted } from "./judge-species.ts";
import type { Ranking } from "./ranking.ts";
import { termsOf } from "./terms-of.ts";

export const priors = ["prevalence", "even"] as const;
export type Prior = (typeof priors)[number];
export type RankOptions = Readonly<{ /** By how common a species is, or all alike. */ prior?: Prior }>;

/**
 * Ranks every species of the table by what was seen and measured. The order of the readings changes nothing; a species that
 * two independent observations contradict is listed apart with both, since a single slip must not take the truth away;
 * equal scores stand in the order of their ids.
 *
 * It never concludes: natural, synthetic and treated forms share their constants and stand under one species.
 *
 * @param evidence as parseEvidence lets it through
 * @returns probabilities among the species that are not contradicted and an unlisted one; they sum to 1
 *
 * Source: Bayes' rule with the likelihoods described beside each term; model version in the result.
 */
export function rankSpecies(evidence: Evidence, table: SpeciesTable, { prior = "prevalence" }: RankOptions = {}): Ranking {
  const terms = termsOf(evidence);
  const plan = planOf(terms);
  const weights = table.nodes.map(({ weight }) => (prior === "even" ? 1 : Math.max(weight, priorFloor)));
  const weightSum = weights.reduce((sum, weight) => sum + weight, 0);
  const judged = table.nodes
    .map((node, index) => {
      const verdict = judgeSpecies(node, plan);
      return { node, verdict, score: Math.log(((1 - unlistedPrior) * weights[index]!) / weightSum) + verdict.logLikelihood };
    })
    .sort((a, b) => b.score - a.score || compareIds(a.node.id, b.node.id));

  const open = judged.filter(({ verdict }) => !verdict.isContradicted);
  const unlistedScore = Math.log(unlistedPrior) + terms.reduce((sum, term) => sum + term.unlistedLogLikelihood, 0);
  const norm = logSumExp([...open.map(({ score }) => score), unlistedScore]);
  const candidates = open.map(({ node, verdict, score }) => ({ speciesId: node.id, name: node.name, probability: Math.exp(score - norm), evidence: evidenceLines(node, verdict, terms) }));
  return {
    ...(evidence.id !== undefined && { id: evidence.id }),
    tableVersion: table.version,
    modelVersion,
    candidates,
    unlisted: Math.exp(unlistedScore - norm),
    contradicted: judged.filter(({ verdict }) => verdict.isContradicted).map(({ node, verdict }) => ({ speciesId: node.id, because: whyContradicted(verdict, plan) })),
    inseparable: inseparable(table.lookalikes, candidates),
  };
}

/** Groups of look-alikes of which at least two are still open and one of them counts. */
function inseparable(lookalikes: readonly Lookalike[], candidates: ReadonlyArray<{ speciesId: string; probability: number }>): Ranking["inseparable"] {
  const open = new Map(candidates.map(({ speciesId, probability }) => [speciesId, probability]));
  return lookalikes.flatMap(({ speciesIds, settledBy }) => {
    const left = speciesIds.filter((id) => (open.get(id) ?? 0) >= 0.005);
    return left.length >= 2 && left.some((id) => open.get(id)! >= 0.05) ? [{ speciesIds: left, settledBy }] : [];
  });
}
