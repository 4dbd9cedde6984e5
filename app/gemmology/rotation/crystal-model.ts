import { edgesAtTilt, edgesWithTilt, facetView, sheetsOf, upperVibrationDeg, type PrincipalIndices, type TiltedEdges } from "./edge-indices.ts";
import { deviations, type Observed } from "./observed.ts";
import { turned, type Orientation } from "./vector.ts";

/** How many different principal indices: 1 isotropic, 2 uniaxial (along axes 1 and 2, then 3), 3 biaxial. */
export type Rank = 1 | 2 | 3;
export type Crystal = Readonly<{ rank: Rank; free: readonly number[]; axes: readonly Orientation[] }>;

/** A uniaxial crystal does not change when it turns about its axis, an isotropic one in no way. */
export const turnsOf: Readonly<Record<Rank, number>> = { 1: 0, 2: 2, 3: 3 };

export const principalOf = ({ rank, free }: Pick<Crystal, "rank" | "free">): PrincipalIndices => (rank === 1 ? [free[0]!, free[0]!, free[0]!] : rank === 2 ? [free[0]!, free[0]!, free[1]!] : [free[0]!, free[1]!, free[2]!]);
export const inOrder = (crystal: Pick<Crystal, "rank" | "free">) => [...principalOf(crystal)].sort((a, b) => a - b) as [number, number, number];
export const parameterCount = ({ rank, axes }: Pick<Crystal, "rank" | "axes">) => rank + axes.length * turnsOf[rank];

/** The crystal with its parameters moved: first its indices, then each facet's orientation by a small turn. */
export function moved(crystal: Crystal, step: readonly number[]): Crystal {
  const turns = turnsOf[crystal.rank];
  return {
    ...crystal,
    free: crystal.free.map((value, at) => value + step[at]!),
    axes: turns === 0 ? crystal.axes : crystal.axes.map((axes, at) => turned(axes, [step[crystal.rank + at * turns]!, step[crystal.rank + at * turns + 1]!, turns === 3 ? step[crystal.rank + at * turns + 2]! : 0])),
  };
}

/** What the crystal shows at every position, and how far the readings are from it. */
export type Shown = Readonly<{ edges: readonly TiltedEdges[]; residuals: readonly (readonly number[])[] }>;

export function shownOf(crystal: Crystal, { positions }: Observed): Shown {
  const sheets = sheetsOf(principalOf(crystal));
  const edges = positions.map(({ facet, angleDeg }) => edgesWithTilt(sheets, facetView(crystal.axes[facet]!, angleDeg)));
  return { edges, residuals: positions.map((position, at) => deviations(position, edges[at]!, vibration(crystal, position))) };
}

/**
 * The residuals of a crystal near one whose tilts are known. An edge is a maximum over the tilt, so that it does not
 * change with the tilt to the first order: for derivatives this is exact.
 *
 * @param facet where only one facet's crystal was turned, that facet; the others' residuals come back empty
 */
export function residualsNear(crystal: Crystal, { positions }: Observed, { edges }: Shown, facet: number | null): readonly (readonly number[])[] {
  const sheets = sheetsOf(principalOf(crystal));
  return positions.map((position, at) => (facet !== null && position.facet !== facet ? [] : deviations(position, edgesAtTilt(sheets, facetView(crystal.axes[position.facet]!, position.angleDeg), edges[at]!), vibration(crystal, position))));
}

function vibration(crystal: Crystal, { facet, angleDeg, polariserDeg }: { facet: number; angleDeg: number; polariserDeg: number | null }): number | null {
  return polariserDeg === null || crystal.rank === 1 ? null : upperVibrationDeg(principalOf(crystal), crystal.axes[facet]!, angleDeg);
}

/** The facet's crystal as a mirror in the facet shows it: it has the same edges, and vibrations on the other side of the normal. */
export function mirrored(axes: Orientation): Orientation {
  // All three axes mirrored would be left-handed; an axis has no arrow, so one of them is turned round.
  return [[axes[0][0], axes[0][1], -axes[0][2]], [axes[1][0], axes[1][1], -axes[1][2]], [-axes[2][0], -axes[2][1], axes[2][2]]];
}
