import { edgeIndices, type EdgePair } from "./edge-indices.ts";
import type { AxisOnFacet, RotationSolution } from "./rotation-fit.ts";
import { cross, dot, unit, type Orientation, type Vector } from "./vector.ts";

const degree = Math.PI / 180;

/**
 * Both edges that a solution of a rotation run would show on one of its facets.
 *
 * @param facet label of the facet, as the run names it
 * @returns edges by rotation in degrees; null where the solution has no whole crystal or does not know the facet
 *
 * Axes are told without arrow and mod 180°: of the two that a direction can mean, those are taken that stand square to
 * each other. What is left, a half turn of the whole crystal about the facet's normal, shows the same edges.
 */
export function edgesOfSolution({ indices, orientation }: RotationSolution, facet: string): ((angleDeg: number) => EdgePair) | null {
  if ("n" in indices) return () => ({ upper: indices.n, lower: indices.n });
  const axes = orientation.find((each) => each.facet === facet)?.axes;
  if (!axes) return null;
  if ("omega" in indices) {
    const c = directionOf(axes[0]!);
    const square: Orientation = [...squareTo(c), c];
    return (angleDeg) => edgeIndices([indices.omega, indices.omega, indices.epsilon], square, angleDeg);
  }
  if (!("beta" in indices)) return null;
  const z = directionOf(axes.find(({ axis }) => axis === "Z")!);
  const x = squarest(axes.find(({ axis }) => axis === "X")!, z);
  const square: Orientation = [x, cross(z, x), z];
  return (angleDeg) => edgeIndices([indices.alpha, indices.beta, indices.gamma], square, angleDeg);
}

function directionOf({ fromNormalDeg, azimuthDeg }: AxisOnFacet, turnDeg = 0): Vector {
  const [polar, azimuth] = [fromNormalDeg * degree, (azimuthDeg + turnDeg) * degree];
  return [Math.sin(polar) * Math.cos(azimuth), Math.sin(polar) * Math.sin(azimuth), Math.cos(polar)];
}

function squarest(axis: AxisOnFacet, to: Vector): Vector {
  const [one, other] = [directionOf(axis), directionOf(axis, 180)];
  return Math.abs(dot(one, to)) <= Math.abs(dot(other, to)) ? one : other;
}

function squareTo(c: Vector): [Vector, Vector] {
  const from: Vector = Math.abs(c[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0];
  const first = unit(cross(from, c));
  return [first, cross(c, first)];
}
