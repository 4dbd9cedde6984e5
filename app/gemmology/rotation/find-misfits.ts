import { principalOf } from "./crystal-model.ts";
import { upperVibrationDeg } from "./edge-indices.ts";
import { halfTurn, isMerged, type Observed, type Position } from "./observed.ts";
import type { Refined } from "./refine.ts";
import { polariserUDeg, type RotationRun } from "./rotation-run.ts";
import type { Misfit } from "./rotation-fit.ts";

/** In standard uncertainties: beyond this a reading is named. */
const outlierAt = 3.5;

type Deviation = Readonly<{ at: number; edge: Misfit["edge"]; /** Observed less computed, in standard uncertainties. */ by: number }>;

/** Every reading, edge by edge, less what the crystal shows there; an edge that was read once counts once. */
export function edgeByEdge({ crystal, shown }: Refined, { positions }: Observed): Deviation[] {
  return positions.flatMap((position, at): Deviation[] => {
    const { upper, lower, u, polariserDeg } = position;
    const edges = shown.edges[at]!;
    const found: Deviation[] = [];
    if (isMerged(position)) found.push({ at, edge: "upper", by: (upper! - (edges.upper + edges.lower) / 2) / u });
    else {
      if (upper !== null) found.push({ at, edge: "upper", by: (upper - edges.upper) / u });
      if (lower !== null) found.push({ at, edge: "lower", by: (lower - edges.lower) / u });
    }
    if (polariserDeg !== null && crystal.rank > 1) found.push({ at, edge: "polariser", by: halfTurn(polariserDeg - upperVibrationDeg(principalOf(crystal), crystal.axes[position.facet]!, position.angleDeg)) / polariserUDeg });
    return found;
  });
}

/** Readings that the crystal does not explain, by name. */
export function findMisfits(refined: Refined, observed: Observed, run: RotationRun): Misfit[] {
  return namedMisfits(edgeByEdge(refined, observed).map(({ at, edge, by }) => ({ position: observed.positions[at]!, edge, by })), run);
}

/** What deviates too far, in words, the worst first. */
export function namedMisfits(deviations: readonly Readonly<{ position: Position; edge: Misfit["edge"]; by: number }>[], { facets }: RotationRun): Misfit[] {
  return deviations
    .filter(({ by }) => Math.abs(by) > outlierAt)
    .sort((a, b) => Math.abs(b.by) - Math.abs(a.by))
    .map(({ position: { facet, angleDeg }, edge, by }) => {
      const { label } = facets[facet]!;
      const what = edge === "polariser" ? "the polariser's azimuth" : "the reading";
      return { facet: label, angleDeg, edge, by, message: `${what} at ${angleDeg}°${facets.length > 1 ? ` on the ${label}` : ""} doesn't fit: ${Math.abs(by).toFixed(1)} u` };
    });
}

/** Root mean square of the edges less what the crystal shows. */
export function rmsOf(refined: Refined, observed: Observed): number {
  const edges = edgeByEdge(refined, observed).filter(({ edge }) => edge !== "polariser");
  return Math.sqrt(edges.reduce((sum, { at, by }) => sum + (by * observed.positions[at]!.u) ** 2, 0) / edges.length);
}
