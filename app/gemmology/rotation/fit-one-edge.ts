import { edgeExtremes, type EdgeExtremes } from "./edge-extremes.ts";
import { findClosure } from "./find-closure.ts";
import { namedMisfits } from "./find-misfits.ts";
import { observedOf } from "./observed.ts";
import { rotationModelVersion, type RotationFit, type RotationSolution } from "./rotation-fit.ts";
import type { RotationRun } from "./rotation-run.ts";

/**
 * Where only one of the edges was ever seen: the smallest index α from the lower edge, or the largest γ from the upper
 * one, which every facet shows (theorem T1), and the other extreme of that edge as a bound of β. The rest stays open.
 */
export function fitOneEdge(run: RotationRun, edge: "upper" | "lower"): RotationFit {
  const positions = observedOf(run).positions.filter((position) => position[edge] !== null);
  const byFacet = run.facets.flatMap((_, facet) => {
    const own = positions.filter((position) => position.facet === facet);
    return own.length === 0 ? [] : [{ own, extremes: edgeExtremes(own, edge) }];
  });
  const weight = byFacet.reduce((sum, { extremes }) => sum + extremes.uOuter ** -2, 0);
  const outer = byFacet.reduce((sum, { extremes }) => sum + extremes.outer * extremes.uOuter ** -2, 0) / weight;
  const inner = byFacet.map(({ extremes }) => extremes.inner);
  const u = weight ** -0.5;
  const residuals = byFacet.flatMap(({ own, extremes }) => own.map((position, at) => ({ position, by: extremes.residuals[at]! })));
  const isStill = byFacet.every(({ extremes }) => extremes.parameters === 1);
  const solution: RotationSolution = {
    character: "undetermined",
    sign: null,
    indices: edge === "lower" ? { alpha: outer } : { gamma: outer },
    u: edge === "lower" ? { alpha: u } : { gamma: u },
    birefringence: null,
    twoVDeg: null,
    orientation: [],
    rms: Math.sqrt(residuals.reduce((sum, { position, by }) => sum + (by * position.u) ** 2, 0) / residuals.length),
    deltaChiSquared: 0,
    bounds: edge === "lower" ? { betaAtLeast: Math.max(outer, ...inner) } : { betaAtMost: Math.min(outer, ...inner) },
  };
  return {
    solutions: [solution],
    decided: false,
    decideBy: isStill
      ? "One edge that stays still: look between crossed polars in three directions whether the stone is singly refractive, and look for a hidden second edge with the polariser."
      : `Only the ${edge} edge was seen. Look for the other with the polariser, or over the limit by another method; until then ${edge === "lower" ? "γ and the birefringence are open upwards" : "α and the birefringence are open downwards"}.`,
    outliers: namedMisfits(residuals.map((each) => ({ ...each, edge })), run),
    closure: findClosure(run),
    chiSquared: residuals.reduce((sum, { by }) => sum + by * by, 0),
    degreesOfFreedom: Math.max(0, residuals.length - parametersOf(byFacet)),
    modelVersion: rotationModelVersion,
  };
}

/** The outer extreme is one for all facets. */
const parametersOf = (byFacet: readonly { extremes: EdgeExtremes }[]) => byFacet.reduce((sum, { extremes }) => sum + extremes.parameters - 1, 1);
