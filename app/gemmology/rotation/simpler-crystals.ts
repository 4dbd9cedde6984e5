import { inOrder, parameterCount, type Crystal, type Rank } from "./crystal-model.ts";
import type { Observed } from "./observed.ts";
import { refine, type Refined } from "./refine.ts";
import { cross, type Orientation } from "./vector.ts";

/** χ² that so many superfluous parameters take off by chance in 5 % of runs, and in 0.27 % (3σ). */
const byChance5 = [0, 3.84, 5.99, 7.81, 9.49, 11.07, 12.59, 14.07, 15.51, 16.92, 18.31, 19.68, 21.03, 22.36, 23.68, 25, 26.3, 27.59, 28.87, 30.14];
const byChance027 = [0, 9, 11.83, 14.16, 16.25, 18.21, 20.06, 21.85, 23.57, 25.26, 26.9, 28.51, 30.1, 31.7, 33.2, 34.7, 36.3, 37.8, 39.2, 40.7];
export const chanceOf = (parameters: number, share: "5 %" | "0.27 %") => (share === "5 %" ? byChance5 : byChance027)[Math.min(parameters, byChance5.length - 1)]!;
/** Indices nearer than this, in what is uncertain about their distance, are hardly told apart (formulas.md §4.6). */
const leastGapU = 3;

/** A uniaxial crystal of whose equal indices readings say only that they are nearer than this share of the birefringence is not told from a biaxial one. */
const resolvedShare = 0.4;

/** A minimum, and of a uniaxial one how far apart the two indices that count as one may be (95 %). */
export type Candidate = Refined & Readonly<{ gapAtMost?: number }>;

/**
 * What a biaxial minimum amounts to: a uniaxial crystal where that fits as well as can be told, and readings are good
 * enough to tell; the biaxial one where they speak against it at 99.7 %; between, both, the simpler first.
 */
export function simplerWhereAlike(found: Refined, observed: Observed): Candidate[] {
  const { crystal, covariance } = found;
  const [smallest, middle, largest] = crystal.free.map((value, at) => ({ value, at })).sort((a, b) => a.value - b.value) as [IndexAt, IndexAt, IndexAt];
  const superfluous = parameterCount({ rank: 3, axes: crystal.axes }) - parameterCount({ rank: 2, axes: crystal.axes });
  const [best] = ([[smallest, middle, largest], [middle, largest, smallest]] as const)
    .map(([one, other, unlike]) => ({ gap: Math.abs(one.value - other.value), uGap: gapU(covariance, one.at, other.at), start: uniaxialOf(crystal, one, other, unlike) }))
    .filter(({ gap, uGap }) => gap < 2 * leastGapU * uGap)
    .map(({ gap, uGap, start }): Candidate & { apart: number } => ({ ...refine(start, observed), gapAtMost: gap + 1.96 * uGap, apart: gap / uGap }))
    .filter((each) => isSameMinimum(each, found, each.apart))
    .sort((one, other) => one.chiSquared - other.chiSquared);
  if (!best || best.chiSquared - found.chiSquared >= chanceOf(superfluous, "0.27 %")) return [found];
  const isTold = best.chiSquared - found.chiSquared < chanceOf(superfluous, "5 %") && best.gapAtMost! < resolvedShare * (largest.value - smallest.value);
  return isTold ? [best] : [best, found];
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

/**
 * Whether a uniaxial crystal is the simpler form of a biaxial one, and not of the other crystal that shows the same edges:
 * on the way to that, two indices that are well apart would meet though the fit hardly suffers.
 *
 * @param apart distance of the two indices that meet, in its standard uncertainty
 */
function isSameMinimum(uniaxial: Refined, biaxial: Refined, apart: number): boolean {
  const [a, b] = [inOrder(uniaxial.crystal), inOrder(biaxial.crystal)];
  const u = Math.sqrt(Math.max(0, ...biaxial.covariance.map((row, at) => row[at]!)));
  const isNear = a.every((value, at) => Math.abs(value - b[at]!) < Math.max(2 * leastGapU * u, 1e-4));
  return isNear && apart ** 2 <= leastGapU ** 2 + 2 * Math.max(0, uniaxial.chiSquared - biaxial.chiSquared);
}
