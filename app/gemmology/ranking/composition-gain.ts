import { logSumExp } from "../statistics/log-sum-exp.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { Term } from "./term.ts";

/** Compositions at which index and density of a mixed crystal are taken together, and the share of their ranges that they scatter by there. */
const compositions = [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1];
const scatterShare = 0.15;

/**
 * What is gained when index and density of a mixed crystal belong to one composition, over each varying by itself: a
 * garnet of low index and high density fits each of its ranges and still is none of that series.
 *
 * @param moving the terms of index and density
 * @param separate their log likelihoods' sum by themselves
 */
export function compositionGain(form: SpeciesForm, moving: readonly Term[], separate: number): number {
  const joint = alongComposition(form).map((there) => {
    let sum = 0;
    for (const term of moving) sum += term.score(there, 0).logLikelihood;
    return sum;
  });
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
