import { opticAngle } from "../optics/optic-angle.ts";
import { algebraicStart } from "./algebraic-start.ts";
import { parameterCount, principalOf, type Crystal, type Rank } from "./crystal-model.ts";
import { decideBetween } from "./decide-by.ts";
import { edgeIndices } from "./edge-indices.ts";
import { findClosure } from "./find-closure.ts";
import { fitOneEdge } from "./fit-one-edge.ts";
import { refine, type Refined } from "./refine.ts";
import { rotationModelVersion, type AxisOnFacet, type Misfit, type RotationFit, type RotationSolution } from "./rotation-fit.ts";
import type { RotationRun } from "./rotation-run.ts";
import { turned, type Orientation, type Vector } from "./vector.ts";

/** χ² that a model with so many parameters less exceeds by chance in 0.27 % of runs (3σ). */
const chance = [0, 9, 11.83, 14.16, 16.25, 18.21, 20.06, 21.85, 23.57, 25.26, 26.9, 28.51, 30.1, 31.7, 33.2, 34.7, 36.3, 37.8, 39.2, 40.7];
/** Two solutions apart by less stand side by side (formulas.md §4.6). */
const decidedAt = 9;
const outlierAt = 3.5;
const degree = Math.PI / 180;

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

  const isotropic = refine({ rank: 1, free: [meanIndex(run)], axes: run.facets.map(() => upright) }, run);
  const biaxial = distinct(starts(run).map((start) => refine(start, run)));
  const simplest = biaxial.map((each) => simplerWhereAlike(each, run));
  const least = Math.min(...biaxial.map(({ chiSquared }) => chiSquared), isotropic.chiSquared);
  const isIsotropic = isotropic.chiSquared - least < chanceOf(parameterCount({ rank: 3, axes: isotropic.crystal.axes }) - 1);
  const kept = isIsotropic ? [isotropic] : distinct(simplest).sort((a, b) => order(a, b)).slice(0, 2);

  const best = kept[0]!;
  const degreesOfFreedom = Math.max(1, best.residuals.length - parameterCount(best.crystal));
  const ratio = best.residuals.reduce((sum, { value }) => sum + Math.min(value * value, 6.25), 0) / degreesOfFreedom;
  const widen = ratio > 1 + 3 * Math.sqrt(2 / degreesOfFreedom) ? Math.sqrt(ratio) : 1;
  const from = Math.min(...kept.map(({ chiSquared }) => chiSquared));
  const solutions = kept.map((each) => solutionOf(each, run, { deltaChiSquared: each.chiSquared - from, widen }));
  const isDecided = solutions.length === 1 || solutions[1]!.deltaChiSquared > decidedAt;
  return {
    solutions,
    decided: isDecided,
    decideBy: isIsotropic
      ? "One constant index: confirm between crossed polars that the stone is singly refractive, for a second edge can hide or lie over the limit."
      : isDecided
        ? confirmBy(solutions[0]!)
        : decideBetween(kept[0]!.crystal, kept[1]!.crystal, run, nameOf),
    outliers: outliersOf(best, run),
    closure: findClosure(run),
    chiSquared: best.chiSquared,
    degreesOfFreedom,
    modelVersion: rotationModelVersion,
  };
}

const upright: Orientation = [[1, 0, 0], [0, 1, 0], [0, 0, 1]];
const chanceOf = (parameters: number) => chance[Math.min(parameters, chance.length - 1)]!;
/** What fits alike stands in the order of its parameters, so that the simpler crystal comes first. */
const order = (a: Refined, b: Refined) => (Math.abs(a.chiSquared - b.chiSquared) < 1 ? a.crystal.rank - b.crystal.rank || a.chiSquared - b.chiSquared : a.chiSquared - b.chiSquared);

function meanIndex({ facets }: RotationRun): number {
  let [sum, weights] = [0, 0];
  for (const { upper, lower, u } of facets.flatMap(({ readings }) => readings)) for (const edge of [upper, lower]) if (edge !== null) [sum, weights] = [sum + edge / u ** 2, weights + u ** -2];
  return sum / weights;
}

/** Crystals to begin from: each facet's algebraic ones, combined; a few orientations where there are too few complete positions. */
function starts(run: RotationRun): Crystal[] {
  const byFacet = run.facets.map(({ readings }) => algebraicStart(readings.flatMap(({ angleDeg, upper, lower }) => (upper !== null && lower !== null ? [{ angleDeg, upper, lower }] : []))));
  const first = byFacet.find((found) => found.length > 0);
  if (!first) return fallback(run);
  // Of the other facets only the start whose indices come nearest is combined; both of a facet are tried with each of the first.
  const combined = first.flatMap((start) =>
    byFacet.reduce<Orientation[][]>((lists, found, facet) => {
      const choices = found === first ? [start.axes] : found.length > 0 ? found.map(({ axes }) => axes) : [bestTurn(start.indices, run, facet)];
      return lists.flatMap((list) => choices.slice(0, 2).map((axes) => [...list, axes])).slice(0, 8);
    }, [[]]).map((axes): Crystal => ({ rank: 3, free: [...start.indices], axes })),
  );
  return combined.slice(0, 16);
}

function fallback(run: RotationRun): Crystal[] {
  const edges = run.facets.flatMap(({ readings }) => readings.flatMap(({ upper, lower }) => [upper, lower].filter((edge) => edge !== null)));
  const [alpha, gamma] = [Math.min(...edges), Math.max(...edges)];
  return [0.25, 0.75].map((share) => {
    const free = [alpha, alpha + share * (gamma - alpha), gamma] as [number, number, number];
    return { rank: 3 as Rank, free, axes: run.facets.map((_, facet) => bestTurn(free, run, facet)) };
  });
}

/** Of two dozen orientations the one that a facet's readings fit best. */
function bestTurn(indices: readonly [number, number, number] | readonly number[], { facets }: RotationRun, facet: number): Orientation {
  let [best, least] = [upright, Number.POSITIVE_INFINITY];
  for (const about of [[0, 0], [0.8, 0], [0, 0.8], [0.8, 0.8], [1.4, 0.3], [0.3, 1.4]] as const)
    for (let turn = 0; turn < 4; turn++) {
      const axes = turned(turned(upright, [about[0], about[1], 0]), [0, 0, (turn * Math.PI) / 4]);
      let sum = 0;
      for (const { angleDeg, upper, lower, u } of facets[facet]!.readings) {
        const shown = edgeIndices(indices as readonly [number, number, number], axes, angleDeg);
        if (upper !== null) sum += ((upper - shown.upper) / u) ** 2;
        if (lower !== null) sum += ((lower - shown.lower) / u) ** 2;
      }
      if (sum < least) [least, best] = [sum, axes];
    }
  return best;
}

/** Minima apart in β or in character; of two that are the same, the deeper. */
function distinct(found: readonly Refined[]): Refined[] {
  const kept: Refined[] = [];
  for (const each of [...found].sort((a, b) => a.chiSquared - b.chiSquared)) {
    const [alpha, beta, gamma] = inOrder(each.crystal);
    const isKnown = kept.some((other) => {
      const [a, b, c] = inOrder(other.crystal);
      const near = Math.max(3e-5, 0.25 * Math.min(uOf(each), uOf(other)));
      return Math.abs(a - alpha) < near && Math.abs(b - beta) < near && Math.abs(c - gamma) < near;
    });
    if (!isKnown && each.chiSquared < (kept[0]?.chiSquared ?? 0) + 200) kept.push(each);
    if (kept.length === 0) kept.push(each);
  }
  return kept.slice(0, 3);
}
const inOrder = (crystal: Crystal) => [...principalOf(crystal)].sort((a, b) => a - b) as [number, number, number];
const uOf = ({ covariance }: Refined) => Math.sqrt(Math.max(0, covariance[0]?.[0] ?? 0));

/** The uniaxial crystal instead, where it fits these readings as well as can be told. */
function simplerWhereAlike(found: Refined, run: RotationRun): Refined {
  const { crystal } = found;
  const ranked = crystal.free.map((value, at) => ({ value, at })).sort((a, b) => a.value - b.value);
  const alternatives = ([[0, 1, 2], [2, 1, 0]] as const).map(([one, middle, unlike]) => {
    const [a, b, c] = [ranked[one]!, ranked[middle]!, ranked[unlike]!];
    const axes = crystal.axes.map((each): Orientation => {
      const [x, z] = [each[a.at]!, each[c.at]!];
      const y: Vector = [z[1] * x[2] - z[2] * x[1], z[2] * x[0] - z[0] * x[2], z[0] * x[1] - z[1] * x[0]];
      return [x, y, z];
    });
    return { gap: Math.abs(b.value - a.value), crystal: { rank: 2 as Rank, free: [(a.value + b.value) / 2, c.value], axes } };
  });
  const most = chanceOf(parameterCount({ rank: 3, axes: crystal.axes }) - parameterCount({ rank: 2, axes: crystal.axes }));
  const refined = alternatives.map((each) => refine(each.crystal, run)).sort((a, b) => a.chiSquared - b.chiSquared)[0]!;
  // The same minimum, simpler: not the other one, which has a β of its own.
  const [, beta] = inOrder(crystal);
  const shift = Math.min(...refined.crystal.free.map((value) => Math.abs(value - beta)));
  return refined.chiSquared - found.chiSquared < most && shift < Math.max(4 * Math.sqrt(Math.max(...found.covariance.map((row, at) => row[at]!))), 1e-4) ? refined : found;
}

function solutionOf({ crystal, covariance, residuals }: Refined, { facets }: RotationRun, { deltaChiSquared, widen }: { deltaChiSquared: number; widen: number }): RotationSolution {
  const edges = residuals.filter(({ edge }) => edge !== "polariser");
  const shared = { rms: Math.sqrt(edges.reduce((sum, { value, u }) => sum + (value * u) ** 2, 0) / edges.length), deltaChiSquared };
  const u = (at: number) => widen * Math.sqrt(Math.max(0, covariance[at]![at]!));
  const gap = (i: number, j: number) => widen * Math.sqrt(Math.max(0, covariance[i]![i]! + covariance[j]![j]! - 2 * covariance[i]![j]!));
  if (crystal.rank === 1) return { character: "isotropic", sign: null, indices: { n: crystal.free[0]! }, u: { n: u(0) }, birefringence: null, twoVDeg: null, orientation: [], ...shared };
  if (crystal.rank === 2) {
    const [omega, epsilon] = crystal.free as unknown as [number, number];
    const orientation = facets.map(({ label }, at) => ({ facet: label, axes: [onFacet("c", crystal.axes[at]![2])] }));
    return { character: "uniaxial", sign: epsilon > omega ? "+" : "-", indices: { omega, epsilon }, u: { omega: u(0), epsilon: u(1) }, birefringence: { value: Math.abs(epsilon - omega), u: gap(0, 1) }, twoVDeg: null, orientation, ...shared };
  }
  const at = crystal.free.map((value, index) => ({ value, index })).sort((a, b) => a.value - b.value).map(({ index }) => index) as [number, number, number];
  const [alpha, beta, gamma] = at.map((index) => crystal.free[index]!) as [number, number, number];
  const sorted = at.map((i) => at.map((j) => covariance[i]![j]! * widen ** 2));
  const angle = opticAngle({ alpha, beta: Math.max(beta, alpha + 1e-12), gamma: Math.max(gamma, beta + 1e-12), covariance: sorted });
  const orientation = facets.map(({ label }, facet) => ({ facet: label, axes: (["X", "Y", "Z"] as const).map((name, index) => onFacet(name, crystal.axes[facet]![at[index]!]!)) }));
  return { character: "biaxial", sign: angle.sign, indices: { alpha, beta, gamma }, u: { alpha: u(at[0]), beta: u(at[1]), gamma: u(at[2]) }, birefringence: { value: gamma - alpha, u: gap(at[0], at[2]) }, twoVDeg: { value: angle.twoVDeg, u: angle.uDeg }, orientation, ...shared };
}

function onFacet(axis: AxisOnFacet["axis"], [x, y, z]: Vector): AxisOnFacet {
  return { axis, fromNormalDeg: Math.acos(Math.min(1, Math.abs(z))) / degree, azimuthDeg: ((Math.atan2(y * Math.sign(z || 1), x * Math.sign(z || 1)) / degree) % 180 + 180) % 180 };
}

function outliersOf({ residuals }: Refined, { facets }: RotationRun): Misfit[] {
  return residuals
    .filter(({ value }) => Math.abs(value) > outlierAt)
    .sort((a, b) => Math.abs(b.value) - Math.abs(a.value))
    .map(({ facet, reading, edge, value }) => {
      const { label, readings } = facets[facet]!;
      const { angleDeg } = readings[reading]!;
      const what = edge === "polariser" ? "the polariser's azimuth" : "the reading";
      return { facet: label, angleDeg, edge, by: value, message: `${what} at ${angleDeg}°${facets.length > 1 ? ` on the ${label}` : ""} doesn't fit: ${Math.abs(value).toFixed(1)} u` };
    });
}

function nameOf(crystal: Crystal): string {
  if (crystal.rank === 2) return `a uniaxial crystal with ω ${crystal.free[0]!.toFixed(4)}`;
  return `a biaxial crystal with β ${inOrder(crystal)[1].toFixed(4)}`;
}

function confirmBy({ character, sign }: RotationSolution): string {
  if (character === "uniaxial") return "An interference figure confirms the uniaxial character.";
  return sign === null ? "The sign is open, 2V being near 90°: an interference figure with the accessory plate may tell." : "An interference figure confirms the biaxial character and the sign.";
}

