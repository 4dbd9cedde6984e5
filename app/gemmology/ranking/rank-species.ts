import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { Lookalike, SpeciesForm, SpeciesNode, SpeciesTable } from "../species/species-table.ts";
import { modelVersion, priorFloor, sharedOffset, unlistedPrior, verdictAt } from "./defaults.ts";
import type { Evidence } from "./evidence.ts";
import type { EvidenceLine, Ranking, Verdict } from "./ranking.ts";
import { compareIds } from "./compare-ids.ts";
import type { Score, Term } from "./term.ts";
import { termsOf } from "./terms-of.ts";

export type RankOptions = Readonly<{ /** By how common a species is, or all alike. */ prior?: "prevalence" | "even" }>;

/** Standard uncertainties beyond which nothing but a blunder explains a reading. */
const farOut = 8;
/** What is seen counts as a contradiction only when it is as good as impossible: eyes err. */
const seenContradictsBelow = 0.004;
/** Gauss–Hermite nodes and weights, 5 points, for a standard normal offset. */
const offsets = [0, 0.9585724646138185 * Math.SQRT2, -0.9585724646138185 * Math.SQRT2, 2.0201828704560856 * Math.SQRT2, -2.0201828704560856 * Math.SQRT2].map((node) => node * sharedOffset);
const offsetLogWeights = [0.9453087204829419, 0.3936193231522412, 0.3936193231522412, 0.01995324205904591, 0.01995324205904591].map((weight) => Math.log(weight / Math.sqrt(Math.PI)));

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
  const weights = table.nodes.map(({ weight }) => (prior === "even" ? 1 : Math.max(weight, priorFloor)));
  const weightSum = weights.reduce((sum, weight) => sum + weight, 0);
  const judged = table.nodes.map((node, index) => ({ node, logPrior: Math.log(((1 - unlistedPrior) * weights[index]!) / weightSum), ...judge(node, terms) }));

  const open = judged.filter(({ contradiction }) => contradiction === null);
  const scores = open.map(({ logPrior, logLikelihood }) => logPrior + logLikelihood);
  const unlistedScore = Math.log(unlistedPrior) + terms.reduce((sum, term) => sum + term.unlistedLogLikelihood, 0);
  const norm = logSumExp([...scores, unlistedScore]);
  const candidates = open
    .map((each, index) => ({ ...each, score: scores[index]! }))
    .sort((a, b) => b.score - a.score || compareIds(a.node.id, b.node.id))
    .map(({ node, score, best, bestScores }) => ({
      speciesId: node.id,
      name: node.name,
      probability: Math.exp(score - norm),
      evidence: terms.map((term, index) => lineOf(term, node, best, bestScores[index]!)),
    }));
  const contradicted = judged
    .filter(({ contradiction }) => contradiction !== null)
    .sort((a, b) => b.logPrior + b.logLikelihood - (a.logPrior + a.logLikelihood) || compareIds(a.node.id, b.node.id))
    .map(({ node, contradiction }) => ({ speciesId: node.id, because: contradiction! }));
  return {
    ...(evidence.id !== undefined && { id: evidence.id }),
    tableVersion: table.version,
    modelVersion,
    candidates,
    unlisted: Math.exp(unlistedScore - norm),
    contradicted,
    inseparable: inseparable(table.lookalikes, candidates),
  };
}

type Judged = { logLikelihood: number; best: SpeciesForm; bestScores: Score[]; contradiction: string | null };

/** A species is the mixture of its forms; it is contradicted when every one of them is. */
function judge(node: SpeciesNode, terms: readonly Term[]): Judged {
  const isShared = terms.filter(({ isIndex }) => isIndex).length > 1;
  const hasBoth = terms.some(({ isIndex }) => isIndex) && terms.some(({ property }) => property === "sg");
  let best = node.forms[0]!;
  let bestScores: Score[] = [];
  let bestLog = -Infinity;
  let contradiction: string | null = null;
  let isOpen = false;
  const logs: number[] = [];
  for (const form of node.forms) {
    const scores = terms.map((term) => term.score(form, 0));
    let log = 0;
    for (const score of scores) log += score.logLikelihood;
    // Far out, neither a shared error nor a composition brings a form back.
    if (((form.isSeries && hasBoth) || isShared) && scores.every(({ distance }) => Math.abs(distance) < farOut)) log += form.isSeries && hasBoth ? compositionGain(form, terms, scores) : sharedOffsetGain(form, terms, scores);
    logs.push(Math.log(form.share) + log);
    const against = terms.flatMap((term, index) => (contradicts(term, scores[index]!) ? [index] : []));
    const isAgainst = new Set(against.map((index) => independentKind(terms[index]!.property))).size > 1;
    const isBetter = isAgainst ? !isOpen && log > bestLog : !isOpen || log > bestLog;
    if (!isBetter) continue;
    best = form;
    bestScores = scores;
    bestLog = log;
    isOpen = !isAgainst;
    contradiction = isAgainst ? twoWorst(against, terms, scores).map((index) => terms[index]!.contradiction(form, scores[index]!)).join("; ") : null;
  }
  return { logLikelihood: logSumExp(logs), best, bestScores, contradiction };
}

/** What is gained when all index readings may share one error, over each having none. */
function sharedOffsetGain(form: SpeciesForm, terms: readonly Term[], scores: readonly Score[]): number {
  let separate = 0;
  terms.forEach((term, index) => {
    if (term.isIndex) separate += scores[index]!.logLikelihood;
  });
  const joint = logSumExp(offsets.map((offset, at) => offsetLogWeights[at]! + terms.reduce((sum, term) => (term.isIndex ? sum + term.score(form, offset).logLikelihood : sum), 0)));
  return joint - separate;
}

/** Compositions at which index and density of a mixed crystal are taken together, and the share of their ranges that they scatter by there. */
const compositions = [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1];
const scatterShare = 0.15;

/**
 * What is gained when index and density of a mixed crystal belong to one composition, over each varying by itself: a
 * garnet of low index and high density fits each of its ranges and still is none of that series.
 */
function compositionGain(form: SpeciesForm, terms: readonly Term[], scores: readonly Score[]): number {
  const moving = terms.flatMap((term, index) => (term.isIndex || term.property === "sg" ? [{ term, separate: scores[index]!.logLikelihood }] : []));
  const separate = moving.reduce((sum, each) => sum + each.separate, 0);
  const joint = alongComposition(form).map((there) => moving.reduce((sum, { term }) => sum + term.score(there, 0).logLikelihood, 0));
  return logSumExp(joint) - Math.log(compositions.length) - separate;
}

/** A form's compositions are the same for every stone. */
const formsAlong = new WeakMap<SpeciesForm, readonly SpeciesForm[]>();

function alongComposition(form: SpeciesForm): readonly SpeciesForm[] {
  let along = formsAlong.get(form);
  if (!along) {
    along = compositions.map((share) => atComposition(form, share));
    formsAlong.set(form, along);
  }
  return along;
}

function atComposition(form: SpeciesForm, share: number): SpeciesForm {
  const narrow = (range: readonly [number, number] | null) => {
    if (!range) return null;
    const [width, middle] = [(range[1] - range[0]) * scatterShare, range[0] + share * (range[1] - range[0])];
    return [middle - width, middle + width] as const;
  };
  return { ...form, lowIndex: narrow(form.lowIndex), highIndex: narrow(form.highIndex), spotIndex: narrow(form.spotIndex), sg: narrow(form.sg), usual: {} };
}

function contradicts(term: Term, score: Score): boolean {
  return !term.cannotContradict && score.tail < (term.measure ? verdictAt.contradicts : seenContradictsBelow);
}

const kinds: Readonly<Record<string, string>> = { birefringence: "ri", opticSign: "opticCharacter", heavyLiquid: "sg" };

/** Observations of one kind may share one mistake: a facet, a liquid's edge, a balance. */
function independentKind(property: string): string {
  return kinds[property] ?? property;
}

/** The strongest contradiction, and the strongest of another kind. */
function twoWorst(against: readonly number[], terms: readonly Term[], scores: readonly Score[]): number[] {
  const strength = (index: number) => scores[index]!.logLikelihood - terms[index]!.unlistedLogLikelihood;
  const [first, ...others] = [...against].sort((a, b) => strength(a) - strength(b)) as [number, ...number[]];
  const second = others.find((index) => independentKind(terms[index]!.property) !== independentKind(terms[first]!.property));
  return second === undefined ? [first] : [first, second];
}

function lineOf(term: Term, node: SpeciesNode, best: SpeciesForm, score: Score): EvidenceLine {
  const verdict = verdictOf(term, score);
  return { property: term.property, observed: term.observed, reference: referenceOf(term, node), logLikelihood: score.logLikelihood, verdict, because: because(term, best, score, verdict) };
}

/** What the table says of a species in words does not depend on the stone. */
const references = new WeakMap<SpeciesNode, Map<string, string>>();

function referenceOf({ property, reference }: Term, node: SpeciesNode): string {
  let known = references.get(node);
  if (!known) references.set(node, (known = new Map()));
  let words = known.get(property);
  if (words === undefined) known.set(property, (words = reference(node.forms)));
  return words;
}

function verdictOf(term: Term, score: Score): Verdict {
  if (contradicts(term, score)) return "contradicts";
  return term.measure && score.tail < verdictAt.strained ? "strained" : score.tail < 0.1 && !term.measure ? "strained" : "agrees";
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

/** Groups of look-alikes of which at least two are still open and one of them counts. */
function inseparable(lookalikes: readonly Lookalike[], candidates: ReadonlyArray<{ speciesId: string; probability: number }>): Ranking["inseparable"] {
  const open = new Map(candidates.map(({ speciesId, probability }) => [speciesId, probability]));
  return lookalikes.flatMap(({ speciesIds, settledBy }) => {
    const left = speciesIds.filter((id) => (open.get(id) ?? 0) >= 0.005);
    return left.length >= 2 && left.some((id) => open.get(id)! >= 0.05) ? [{ speciesIds: left, settledBy }] : [];
  });
}
