import { solve } from "../linear/solve.ts";
import { pseudoInverse } from "../linear/pseudo-inverse.ts";
import type { RotationFit, RotationSolution } from "./rotation-fit.ts";
import { rotationModelVersion } from "./rotation-fit.ts";
import { findClosure } from "./find-closure.ts";
import type { RotationRun } from "./rotation-run.ts";

/**
 * Where only one of the edges was ever seen: the smallest index α from the lower edge, or the largest γ from the upper
 * one, and the other extreme of that edge as a bound of β. The rest stays open.
 */
export function fitOneEdge(run: RotationRun, edge: "upper" | "lower"): RotationFit {
  const readings = run.facets.flatMap(({ readings: all }) => all.filter((reading) => reading[edge] !== null));
  const degree = Math.PI / 180;
  const rowOf = (angleDeg: number) => [1, Math.cos(2 * angleDeg * degree), Math.sin(2 * angleDeg * degree)];
  const isTurned = new Set(readings.map(({ angleDeg }) => Math.round((((angleDeg % 180) + 180) % 180) * 10))).size >= 4 && run.facets.length === 1;
  const weightSum = readings.reduce((sum, { u }) => sum + u ** -2, 0);
  const mean = readings.reduce((sum, reading) => sum + reading[edge]! / reading.u ** 2, 0) / weightSum;
  let [least, most, u] = [Math.min(...readings.map((reading) => reading[edge]!)), Math.max(...readings.map((reading) => reading[edge]!)), Math.max(...readings.map((reading) => reading.u))];
  let squares = readings.map((reading) => ((reading[edge]! - mean) / reading.u) ** 2);
  if (isTurned) {
    const normal = [0, 1, 2].map((i) => [0, 1, 2].map((j) => readings.reduce((sum, { angleDeg, u: each }) => sum + (rowOf(angleDeg)[i]! * rowOf(angleDeg)[j]!) / each ** 2, 0)));
    const right = [0, 1, 2].map((i) => readings.reduce((sum, reading) => sum + (rowOf(reading.angleDeg)[i]! * reading[edge]!) / reading.u ** 2, 0));
    const [level, c, s] = solve(normal, right) as [number, number, number];
    const swing = Math.hypot(c, s);
    [least, most] = [level - swing, level + swing];
    const covariance = pseudoInverse(normal);
    u = Math.sqrt(covariance[0]![0]! + (covariance[1]![1]! + covariance[2]![2]!) / 2);
    squares = readings.map((reading) => ((reading[edge]! - rowOf(reading.angleDeg).reduce((sum, value, at) => sum + value * [level, c, s][at]!, 0)) / reading.u) ** 2);
  }
  const chiSquared = squares.reduce((sum, value) => sum + value, 0);
  const name = edge === "lower" ? "alpha" : "gamma";
  const solution: RotationSolution = {
    character: "undetermined",
    sign: null,
    indices: edge === "lower" ? { alpha: least } : { gamma: most },
    u: { [name]: u },
    birefringence: null,
    twoVDeg: null,
    orientation: [],
    rms: Math.sqrt(readings.reduce((sum, reading, at) => sum + squares[at]! * reading.u ** 2, 0) / readings.length),
    deltaChiSquared: 0,
    bounds: edge === "lower" ? { betaAtLeast: most } : { betaAtMost: least },
  };
  return {
    solutions: [solution],
    decided: false,
    decideBy:
      most - least < 3 * u
        ? "One edge that stays still: look between crossed polars in three directions whether the stone is singly refractive, and look for a hidden second edge with the polariser."
        : `Only the ${edge} edge was seen. Look for the other with the polariser, or over the limit by another method; until then ${edge === "lower" ? "γ and the birefringence are open upwards" : "α and the birefringence are open downwards"}.`,
    outliers: [],
    closure: findClosure(run),
    chiSquared,
    degreesOfFreedom: Math.max(0, readings.length - (isTurned ? 3 : 1)),
    modelVersion: rotationModelVersion,
  };
}
