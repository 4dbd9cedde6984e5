import { logLikelihood } from "../ranking/log-likelihood.ts";
import { compareIds } from "../ranking/compare-ids.ts";
import { termsOf } from "../ranking/terms-of.ts";
import { speciesSpan } from "../species/species-span.ts";
import type { SpeciesNode, SpeciesTable } from "../species/species-table.ts";
import type { BenchTest, BenchTestId, Likely, StoneAtBench } from "./bench-test.ts";
import { benchTests } from "./bench-tests.ts";
import { expectedInformation } from "./expected-information.ts";

export type NextTest = Readonly<{
  testId: BenchTestId;
  name: string;
  bits: number;
  minutes: number;
  /** Bits less what its time costs; the list's order. */
  worth: number;
  /** "tells tourmaline from topaz" */
  settles: string;
  isRepeat: boolean;
}>;
export type Vetoed = Readonly<{ testId: BenchTestId; name: string; because: string }>;
export type Setting = StoneAtBench &
  Readonly<{
    /** Tests that can be made and recorded here. */
    offered: ReadonlySet<BenchTestId>;
    /** Tests that were made well; one that was made poorly may be repeated. */
    done: ReadonlySet<BenchTestId>;
    poor: ReadonlySet<BenchTestId>;
    /** Why a test cannot be made here: no consent, the mount, no instrument in check. */
    barred: ReadonlyMap<BenchTestId, string>;
  }>;

const mostHypotheses = 10;
const leastShare = 0.003;
/** Bits that a minute at the bench is worth (house value). */
const bitsPerMinute = 0.01;
/** Below this nothing is recommended. */
const leastWorth = 0.05;
/** A species this likely is protected from what would harm it. */
const protectedAt = 0.01;

/**
 * What to test next: for every test what it is expected to tell about which species the stone is, by this stone's own
 * uncertainties, less its time. A test that can harm one of the likely species, or that is barred, is not recommended
 * but told with its reason.
 *
 * @param candidates of a ranking, with their probabilities
 * @returns the recommended ones, best first, and the vetoed ones that would have been
 *
 * Source: expected information after Lindley 1956; vetoes by harm are house rules.
 */
export function nextTests(candidates: ReadonlyArray<{ speciesId: string; probability: number }>, table: SpeciesTable, setting: Setting): { recommended: NextTest[]; vetoed: Vetoed[] } {
  const byId = new Map(table.nodes.map((node) => [node.id, node]));
  const hypotheses = candidates
    .flatMap(({ speciesId, probability }) => (byId.has(speciesId) && probability >= leastShare ? [{ node: byId.get(speciesId)!, probability }] : []))
    .slice(0, mostHypotheses);
  if (hypotheses.length < 2) return { recommended: [], vetoed: [] };

  const likely = likelyOf(hypotheses.map(({ node }) => node));
  const recommended: NextTest[] = [];
  const vetoed: Vetoed[] = [];
  for (const test of benchTests) {
    if (setting.done.has(test.id) || !setting.offered.has(test.id)) continue;
    const pieces = test.outcomes(setting, likely);
    if (pieces.length === 0) continue;
    const { bits, settles } = judge(pieces, hypotheses, test.sizeOf);
    const worth = bits - bitsPerMinute * test.minutes;
    if (worth < leastWorth) continue;
    const because = setting.barred.get(test.id) ?? harmOf(test, hypotheses);
    if (because) vetoed.push({ testId: test.id, name: test.name, because });
    else recommended.push({ testId: test.id, name: test.name, bits, minutes: test.minutes, worth, settles, isRepeat: setting.poor.has(test.id) });
  }
  recommended.sort((a, b) => b.worth - a.worth || compareIds(a.testId, b.testId));
  return { recommended, vetoed };
}

type Hypothesis = Readonly<{ node: SpeciesNode; probability: number }>;

function judge(pieces: ReturnType<BenchTest["outcomes"]>, hypotheses: readonly Hypothesis[], sizeOf: NonNullable<BenchTest["sizeOf"]> = () => 1): { bits: number; settles: string } {
  const weights = hypotheses.map(({ probability }) => probability);
  const likelihoods = pieces.map((outcomes) => {
    const prepared = outcomes.map((evidence) => ({ terms: termsOf(evidence), size: sizeOf(evidence) }));
    return hypotheses.map(({ node }) => prepared.map(({ terms, size }) => size * Math.exp(logLikelihood(node, terms))));
  });
  // Pieces are read apart: together they tell at most the sum, and no more than there is to tell.
  const entropy = entropyOf(weights);
  const bits = Math.min(entropy, likelihoods.reduce((sum, rows) => sum + expectedInformation(weights, rows), 0));
  let best = { apart: -1, first: 0, second: 1 };
  for (let i = 0; i < hypotheses.length; i++)
    for (let j = i + 1; j < hypotheses.length; j++) {
      const pair = [weights[i]!, weights[j]!];
      const apart = likelihoods.reduce((sum, rows) => sum + expectedInformation(pair, [rows[i]!, rows[j]!]), 0) * (weights[i]! + weights[j]!);
      if (apart > best.apart) best = { apart, first: i, second: j };
    }
  return { bits, settles: `tells ${nameOf(hypotheses[best.first]!)} from ${nameOf(hypotheses[best.second]!)}` };
}

const nameOf = ({ node }: Hypothesis) => node.name.toLowerCase();

function entropyOf(weights: readonly number[]): number {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return weights.reduce((sum, weight) => (weight > 0 ? sum - (weight / total) * Math.log2(weight / total) : sum), 0);
}

function harmOf({ harms }: BenchTest, hypotheses: readonly Hypothesis[]): string | undefined {
  if (!harms) return undefined;
  const atRisk = hypotheses.find(({ node, probability }) => probability > protectedAt && harmedShare(node, harms) >= 0.5);
  return atRisk && `it can damage ${nameOf(atRisk)}, which the stone may be`;
}

/** How much of what is met of a species the test can damage: a rare coated form does not speak for all. */
function harmedShare({ forms }: SpeciesNode, test: NonNullable<BenchTest["harms"]>): number {
  return forms.reduce((sum, { share, harmedBy }) => (harmedBy.includes(test) ? sum + share : sum), 0);
}

function likelyOf(nodes: readonly SpeciesNode[]): Likely {
  const spans = nodes.map(({ forms }) => speciesSpan(forms));
  const hull = (of: ReadonlyArray<readonly [number, number] | null>, otherwise: readonly [number, number]) => {
    const known = of.filter((each) => each !== null);
    return known.length === 0 ? otherwise : ([Math.min(...known.map(([low]) => low)), Math.max(...known.map(([, high]) => high))] as const);
  };
  return { index: hull(spans.map(({ index }) => index), [1.4, 1.8]), sg: hull(spans.map(({ sg }) => sg), [2, 5]), forms: nodes.flatMap(({ forms }) => forms) };
}
