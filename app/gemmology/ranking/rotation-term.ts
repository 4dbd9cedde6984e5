import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import { birefringenceScore, differenceU } from "./birefringence-term.ts";
import { blunderShares, defaultU, softness, span } from "./defaults.ts";
import type { ReadingGrade, RefractiveEvidence, RotationCrystal } from "./evidence.ts";
import { indexTerm, opaque } from "./index-term.ts";
import { numericScore } from "./numeric-score.ts";
import { softUniformDensity } from "./soft-uniform.ts";
import type { Score, Term } from "./term.ts";

type Crystal = Readonly<{ low: number; high: number; beta: number; u: number; logWeight: number }>;

/**
 * A rotation run against a form: least index, birefringence and where β stands between, which are independent, for every
 * crystal that the run allows, each with its weight. Where one facet leaves β open both crystals count.
 *
 * Source: the two solutions of a single facet are equally likely before anything else is known (formulas §10.5).
 */
export function rotationTerm({ solutions, quality = "good" }: Extract<RefractiveEvidence, { kind: "rotation" }>): Term {
  const weightSum = solutions.reduce((sum, { weight = 1 }) => sum + weight, 0);
  const crystals = solutions.map((solution) => crystalOf(solution, weightSum)).sort((a, b) => b.logWeight - a.logWeight || a.low - b.low || a.beta - b.beta);
  return {
    ...indexTerm("ri", observedOf(crystals), quality),
    unlistedLogLikelihood: Math.log(1 / span.index) + Math.log(1 / span.birefringence),
    score: (form, offset) => {
      let best: Score | null = null;
      const logs = crystals.map((crystal) => {
        const score = crystalScore(form, crystal, offset, quality);
        if (!best || score.tail > best.tail) best = score;
        return crystal.logWeight + score.logLikelihood;
      });
      return { ...(best ?? opaque), logLikelihood: logSumExp(logs) };
    },
  };
}

function crystalOf({ indices, u = defaultU.edge, weight = 1 }: RotationCrystal, weightSum: number): Crystal {
  const logWeight = Math.log(weight / weightSum);
  if ("n" in indices) return { low: indices.n, high: indices.n, beta: indices.n, u, logWeight };
  if ("omega" in indices) return { low: Math.min(indices.omega, indices.epsilon), high: Math.max(indices.omega, indices.epsilon), beta: indices.omega, u, logWeight };
  return { low: indices.alpha, high: indices.gamma, beta: indices.beta, u, logWeight };
}

function crystalScore(form: SpeciesForm, { low, high, beta, u, logWeight: _ }: Crystal, offset: number, quality: ReadingGrade): Score {
  const blunderShare = blunderShares[quality];
  if (!form.lowIndex) {
    if (!form.spotIndex) return opaque;
    const score = numericScore({ value: (low + high) / 2 - offset, u, range: form.spotIndex, usual: form.usual.spotIndex, softness: softness.index, span: span.index, blunderShare });
    return { ...score, logLikelihood: score.logLikelihood + birefringenceScore(form, { value: high - low, u: differenceU(u), quality }).logLikelihood };
  }
  const index = numericScore({ value: low - offset, u, range: form.lowIndex, usual: form.usual.lowIndex, softness: softness.index, span: span.index, blunderShare });
  const gap = birefringenceScore(form, { value: high - low, u: differenceU(u), quality });
  const worse = index.tail <= gap.tail ? index : gap;
  return { logLikelihood: index.logLikelihood + gap.logLikelihood + betaLog(form, { low, high, beta, u }, blunderShare), tail: worse.tail, distance: worse.distance };
}

/** Where β stands between the least and the greatest index, as a density over its share of the birefringence; nothing where that is too small to tell. */
function betaLog(form: SpeciesForm, { low, high, beta, u }: Pick<Crystal, "low" | "high" | "beta" | "u">, blunderShare: number): number {
  const gap = high - low;
  if (gap < 3 * u || !form.betaShare) return 0;
  const sigma = Math.hypot((u * Math.sqrt(1.5)) / gap, softness.betaShare);
  const [least, most] = form.betaShare;
  // Within 0 to 1 only: what a reading's error would put beyond an end is found at it.
  const inside = (x: number) => softUniformDensity({ low: least, high: most, sigma }, x) + softUniformDensity({ low: least, high: most, sigma }, x < 0.5 ? -x : 2 - x);
  return Math.log((1 - blunderShare) * inside(Math.min(1, Math.max(0, (beta - low) / gap))) + blunderShare);
}

function observedOf(crystals: readonly Crystal[]): string {
  const first = crystals[0]!;
  if (first.low === first.high) return `${first.low.toFixed(3)} over a rotation`;
  const betas = [...new Set(crystals.map(({ beta }) => beta.toFixed(3)))].sort();
  return `${first.low.toFixed(3)}–${first.high.toFixed(3)} over a rotation, middle index ${betas.join(" or ")}`;
}
