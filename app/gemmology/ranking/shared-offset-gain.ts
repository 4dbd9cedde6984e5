import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import { sharedOffset } from "./defaults.ts";
import type { Term } from "./term.ts";

/** Gauss–Hermite nodes and weights, 5 points, for a standard normal offset. */
const offsets = [0, 0.9585724646138185 * Math.SQRT2, -0.9585724646138185 * Math.SQRT2, 2.0201828704560856 * Math.SQRT2, -2.0201828704560856 * Math.SQRT2].map((node) => node * sharedOffset);
const offsetLogWeights = [0.9453087204829419, 0.3936193231522412, 0.3936193231522412, 0.01995324205904591, 0.01995324205904591].map((weight) => Math.log(weight / Math.sqrt(Math.PI)));

/**
 * What is gained when all index readings of one instrument may share one error, over each having none.
 *
 * @param indices the terms of index
 * @param separate their log likelihoods' sum by themselves
 */
export function sharedOffsetGain(form: SpeciesForm, indices: readonly Term[], separate: number): number {
  const joint = offsets.map((offset, at) => {
    let sum = offsetLogWeights[at]!;
    for (const term of indices) sum += term.score(form, offset).logLikelihood;
    return sum;
  });
  return logSumExp(joint) - separate;
}
