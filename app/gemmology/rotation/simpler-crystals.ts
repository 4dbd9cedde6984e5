import { inOrder, parameterCount, type Crystal, type Rank } from "./crystal-model.ts";
import type { Observed } from "./observed.ts";
import { refine, type Refined } from "./refine.ts";
import { cross, type Orientation } from "./vector.ts";

/** χ² that so many superfluous parameters take off by chance in 5 % of runs, and in 0.27 % (3σ). */
const byChance5 = [0, 3.84, 5.99, 7.81, 9.49, 11.07, 12.59, 14.07, 15.51, 16.92, 18.31, 19.68, 21.03, 22.36, 23.68, 25, 26.3, 27.59, 28.87, 30.14];
const byChance027 = [0, 9, 11.83, 14.16, 16.25, 18.21, 20.06, 21.85, 23.57, 25.26, 26.9, 28.51, 30.1, 31.7, 33.2, 34.7, 36.3, 37.8, 39.2, 40.7];
export const chanceOf = (parameters: number, share: "5 %" | "0.27 %") => (share === "5 %" ? byChance5 : byChance027)[Math.min(parameters, byChance5.length - 1)]!;
/** Indices apart by less are not told apart by themselves (formulas.md §4.6). */
const leastGapU = 3;

/**
 * What a biaxial minimum amounts to: a uniaxial crystal where that fits as well as can be told; both, the simpler first,
 * where readings speak against it at 95 % but not at 99.7 %; or the biaxial one.
 */
export function simplerWhereAlike(found: Refined, observed: Observed): Refined[] {
  const { crystal, covariance } = found;
  const [smallest, middle, largest] = crystal.free.map((value, at) => ({ value, at })).sort((a, b) => a.value - b.value) as [IndexAt, IndexAt, IndexAt];
  const alternatives = [[smallest, middle, largest], [middle, largest, smallest]] as const;
  const near = alternatives.filter(([one, other]) => Math.abs(one.value - other.value) < leastGapU * gapU(covariance, one.at, other.at));
  if (near.length === 0) return [found];
  const superfluous = parameterCount({ rank: 3, axes: crystal.axes }) - parameterCount({ rank: 2, axes: crystal.axes });
  const best = near.map(([one, other, unlike]) => refine(uniaxialOf(crystal, one, other, unlike), observed)).sort((a, b) => a.chiSquared - b.chiSquared)[0]!;
  const worseBy = best.chiSquared - found.chiSquared;
  if (worseBy >= chanceOf(superfluous, "0.27 %") || !isSameMinimum(best, found)) return [found];
  return worseBy < chanceOf(superfluous, "5 %") ? [best] : [best, found];
}

type IndexAt = { value: number; at: number };
const gapU = (covariance: Refined["covariance"], i: number, j: number) => Math.max(1e-6, Math.sqrt(Math.max(0, covariance[i]![i]! + covariance[j]![j]! - 2 * covariance[i]![j]!)));

function uniaxialOf(crystal: Crystal, one: IndexAt, other: IndexAt, unlike: IndexAt): Crystal {
  const axes = crystal.axes.map((each): Orientation => {
    const [x, z] = [each[one.at]!, each[unlike.at]!];
    return [x, cross(z, x), z];
  });
  return { rank: 2 as Rank, free: [(one.value + other.value) / 2, unlike.value], axes };
}

/** Not the other minimum, which has a β of its own. */
function isSameMinimum(uniaxial: Refined, biaxial: Refined): boolean {
  const [a, b] = [inOrder(uniaxial.crystal), inOrder(biaxial.crystal)];
  const u = Math.sqrt(Math.max(0, ...biaxial.covariance.map((row, at) => row[at]!)));
  return a.every((value, at) => Math.abs(value - b[at]!) < Math.max(leastGapU * u, 1e-4));
}
