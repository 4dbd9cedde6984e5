import { algebraicStart } from "./algebraic-start.ts";
import { inOrder, principalOf, type Crystal } from "./crystal-model.ts";
import { distinctMinima } from "./distinct-minima.ts";
import { bestTurn } from "./best-turn.ts";
import type { PrincipalIndices } from "./edge-indices.ts";
import type { Observed, Position } from "./observed.ts";
import { refine, type Refined } from "./refine.ts";
import { twinsOf } from "./twins-of.ts";
import type { Orientation } from "./vector.ts";

const mostMinima = 4;
const mostJoint = 4;

/** Every biaxial crystal that is a minimum for these readings; joint over the facets, whose indices are the same. */
export function biaxialMinima(observed: Observed): Refined[] {
  const byFacet = Array.from({ length: observed.facetCount }, (_, facet) => observed.positions.filter((position) => position.facet === facet));
  if (byFacet.length === 1) return minimaOfFacet(byFacet[0]!);
  const own = byFacet.map((positions) => (positions.length >= 3 ? minimaOfFacet(positions.map((position) => ({ ...position, facet: 0 }))) : []));
  const first = own.findIndex((minima) => minima.length > 0);
  if (first < 0) return [];
  // Facets are joined one after the other; the combinations whose indices agree best are carried on.
  let joined: { indices: readonly number[]; strain: number; axes: Map<number, Orientation> }[] = own[first]!.map(({ crystal }) => ({ indices: crystal.free, strain: 0, axes: new Map([[first, crystal.axes[0]!]]) }));
  own.forEach((minima, facet) => {
    if (facet === first) return;
    joined = joined
      .flatMap((each) =>
        minima.length === 0
          ? [{ ...each, axes: new Map(each.axes).set(facet, bestTurn(each.indices as PrincipalIndices, byFacet[facet]!)) }]
          : minima.map((minimum) => ({ ...each, strain: each.strain + apart(each.indices, minimum), axes: new Map(each.axes).set(facet, axesInOrderOf(each.indices, minimum.crystal)) })),
      )
      .sort((a, b) => a.strain - b.strain)
      .slice(0, mostJoint);
  });
  return distinctMinima(joined.map(({ indices, axes }) => refine({ rank: 3, free: indices, axes: byFacet.map((_, facet) => axes.get(facet)!) }, observed))).slice(0, mostMinima);
}

/** Both crystals that show one facet's edges, and what other minima incomplete readings leave. */
function minimaOfFacet(positions: readonly Position[]): Refined[] {
  const observed: Observed = { facetCount: 1, positions };
  const pairs = positions.flatMap(({ angleDeg, upper, lower }) => (upper !== null && lower !== null ? [{ angleDeg, upper, lower }] : []));
  const isComplete = pairs.length === positions.length && pairs.length >= 6;
  const starts = algebraicStart(pairs).map(({ indices, axes }): Crystal => ({ rank: 3, free: indices, axes: [axes] }));
  const found = distinctMinima([...starts, ...(isComplete && starts.length > 0 ? [] : guesses(positions))].map((start) => refine(start, observed)));
  const twins = found.slice(0, 2).flatMap(({ crystal }) => twinsOf({ indices: principalOf(crystal), axes: crystal.axes[0]! }));
  return distinctMinima([...found, ...twins.map(({ indices, axes }) => refine({ rank: 3, free: indices, axes: [axes] }, observed))]).slice(0, mostMinima);
}

/** Crystals to begin from where positions are few or edges are missing. */
function guesses(positions: readonly Position[]): Crystal[] {
  const edges = positions.flatMap(({ upper, lower }) => [upper, lower].filter((edge) => edge !== null));
  const [alpha, gamma] = [Math.min(...edges), Math.max(...edges) + 1e-4];
  return [0.1, 0.5, 0.9].map((share): Crystal => {
    const free: PrincipalIndices = [alpha, alpha + share * (gamma - alpha), gamma];
    return { rank: 3, free, axes: [bestTurn(free, positions)] };
  });
}

/** How far another facet's indices are from these, in what is uncertain about them. */
function apart(indices: readonly number[], { crystal, covariance }: Refined): number {
  const [a, b] = [[...indices].sort((x, y) => x - y), inOrder(crystal)];
  const floor = 1e-5;
  return a.reduce((sum, value, at) => sum + ((value - b[at]!) / Math.max(floor, Math.sqrt(Math.max(0, covariance[at]![at]!)))) ** 2, 0);
}

/** The crystal's axes so that the smallest of its indices stands where the smallest of `indices` does, and so on. */
function axesInOrderOf(indices: readonly number[], crystal: Crystal): Orientation {
  const rank = (values: readonly number[]) => values.map((_, at) => at).sort((i, j) => values[i]! - values[j]!);
  const [mine, theirs] = [rank(crystal.free), rank(indices)];
  const [x, y, z] = [0, 1, 2].map((place) => crystal.axes[0]![mine[theirs.indexOf(place)]!]!) as unknown as Orientation;
  const volume = x[0] * (y[1] * z[2] - y[2] * z[1]) + x[1] * (y[2] * z[0] - y[0] * z[2]) + x[2] * (y[0] * z[1] - y[1] * z[0]);
  return volume < 0 ? [x, y, [-z[0], -z[1], -z[2]]] : [x, y, z];
}
