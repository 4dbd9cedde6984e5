import { biaxialMinima } from "./biaxial-minima.ts";
import { inOrder, parameterCount, type Crystal } from "./crystal-model.ts";
import { decideBetween } from "./decide-by.ts";
import { distinctMinima } from "./distinct-minima.ts";
import { findClosure } from "./find-closure.ts";
import { findMisfits, rmsOf } from "./find-misfits.ts";
import { fitOneEdge } from "./fit-one-edge.ts";
import { isMerged, observedOf, type Observed } from "./observed.ts";
import { refine, type Refined } from "./refine.ts";
import { rotationModelVersion, type RotationFit, type RotationSolution } from "./rotation-fit.ts";
import type { RotationRun } from "./rotation-run.ts";
import { chanceOf, simplerWhereAlike, type Candidate } from "./simpler-crystals.ts";
import { solutionOf } from "./solution-of.ts";
import type { Orientation } from "./vector.ts";

/** Two solutions apart by less stand side by side (formulas.md §4.6). */
const decidedAt = 9;
const mostSolutions = 4;

/**
 * Fits a rotation run: the crystals that would show these edges, simplest first where they fit alike.
 *
 * One facet determines the smallest and the largest index; the middle one is two-fold, unless the edges touch, the
 * polariser was read, or a second facet was. Then both solutions come back, with what would decide. Isotropic, uniaxial or
 * biaxial is a matter of how much worse the simpler crystal fits, never of a majority of readings.
 *
 * @param run as parseRotationRun lets it through
 * @returns uncertainties are standard ones, by the covariance of the fit, widened where the readings scatter by more than they claim
 * @throws RangeError when there are fewer than three readings
 *
 * Source: edges at which energy grazes the facet, and the two-fold β, derived in the project's formulas; evidence by
 * likelihood ratio.
 */
export function fitRotation(run: RotationRun): RotationFit {
  const readings = run.facets.flatMap(({ readings: all }) => all);
  if (readings.length < 3) throw new RangeError(`${readings.length} readings: a rotation run needs at least three`);
  if (readings.every(({ upper }) => upper === null)) return fitOneEdge(run, "lower");
  if (readings.every(({ lower }) => lower === null)) return fitOneEdge(run, "upper");

  const observed = observedOf(run);
  const isotropic = refine({ rank: 1, free: [meanIndex(observed)], axes: run.facets.map(() => upright) }, observed);
  const biaxial = biaxialMinima(observed);
  const least = Math.min(isotropic.chiSquared, ...biaxial.map(({ chiSquared }) => chiSquared));
  const isIsotropic = isotropic.chiSquared - least < chanceOf(parameterCount({ rank: 3, axes: isotropic.crystal.axes }) - 1, "0.27 %");
  const kept: readonly Candidate[] = isIsotropic ? [isotropic] : distinctMinima(biaxial.flatMap((each) => simplerWhereAlike(each, observed))).sort(simplerFirst).slice(0, mostSolutions);

  const best = kept[0]!;
  const degreesOfFreedom = Math.max(1, countOf(observed) - parameterCount(best.crystal));
  const widen = widening(best, degreesOfFreedom);
  const from = Math.min(...kept.map(({ chiSquared }) => chiSquared));
  const solutions = kept.map((each) => solutionOf(each, run, { deltaChiSquared: each.chiSquared - from, widen, rms: rmsOf(each, observed) }));
  const rivals = kept.filter(({ chiSquared }) => chiSquared - from <= decidedAt);
  const isDecided = rivals.length === 1;
  return {
    solutions,
    decided: isDecided,
    decideBy: isIsotropic
      ? "One constant index: confirm between crossed polars that the stone is singly refractive, for a second edge can hide or lie over the limit."
      : isDecided
        ? confirmBy(solutions[kept.indexOf(rivals[0]!)]!)
        : decideBetween(rivals[0]!.crystal, furthestFrom(rivals), run),
    outliers: findMisfits(best, observed, run),
    closure: findClosure(run),
    chiSquared: best.chiSquared,
    degreesOfFreedom,
    modelVersion: rotationModelVersion,
  };
}

const upright: Orientation = [[1, 0, 0], [0, 1, 0], [0, 0, 1]];
/** What fits alike stands in the order of its parameters, so that the simpler crystal comes first. */
const simplerFirst = (a: Refined, b: Refined) => (Math.abs(a.chiSquared - b.chiSquared) < 1 ? a.crystal.rank - b.crystal.rank || a.chiSquared - b.chiSquared : a.chiSquared - b.chiSquared);

function meanIndex({ positions }: Observed): number {
  let [sum, weights] = [0, 0];
  for (const { upper, lower, u } of positions) for (const edge of [upper, lower]) if (edge !== null) [sum, weights] = [sum + edge / u ** 2, weights + u ** -2];
  return sum / weights;
}

/** How many values were read. */
const countOf = ({ positions }: Observed) => positions.reduce((sum, position) => sum + (position.upper === null ? 0 : 1) + (position.lower === null || isMerged(position) ? 0 : 1) + (position.polariserDeg === null ? 0 : 1), 0);

/** By how much readings scatter beyond their uncertainties, where that is more than chance. */
function widening({ shown }: Refined, degreesOfFreedom: number): number {
  const ratio = shown.residuals.flat().reduce((sum, value) => sum + Math.min(value * value, 6.25), 0) / degreesOfFreedom;
  return ratio > 1 + 3 * Math.sqrt(2 / degreesOfFreedom) ? Math.sqrt(ratio) : 1;
}

/** The rival of the first whose middle index differs most. */
function furthestFrom([first, ...others]: readonly Refined[]): Crystal {
  const [, beta] = inOrder(first!.crystal);
  const distance = ({ crystal }: Refined) => Math.abs(inOrder(crystal)[1] - beta);
  return [...others].sort((a, b) => distance(b) - distance(a))[0]!.crystal;
}

function confirmBy({ character, sign }: RotationSolution): string {
  if (character === "uniaxial") return "An interference figure confirms the uniaxial character.";
  return sign === null ? "The sign is open, 2V being near 90°: an interference figure with the accessory plate may tell." : "An interference figure confirms the biaxial character and the sign.";
}
