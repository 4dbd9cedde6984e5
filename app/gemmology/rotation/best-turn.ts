import { edgeIndices, type PrincipalIndices } from "./edge-indices.ts";
import type { Position } from "./observed.ts";
import { turned, type Orientation } from "./vector.ts";

const upright: Orientation = [[1, 0, 0], [0, 1, 0], [0, 0, 1]];

/** Of some orientations the one that a facet's readings fit best. */
export function bestTurn(indices: PrincipalIndices, positions: readonly Position[]): Orientation {
  let [best, least] = [upright, Number.POSITIVE_INFINITY];
  for (const [x, y] of [[0, 0], [0.8, 0], [0, 0.8], [0.8, 0.8], [1.4, 0.3], [0.3, 1.4], [1.4, 1.4]] as const)
    for (let turn = 0; turn < 4; turn++) {
      const axes = turned(turned(upright, [x, y, 0]), [0, 0, (turn * Math.PI) / 4]);
      let sum = 0;
      for (const { angleDeg, upper, lower, u } of positions) {
        const shown = edgeIndices(indices, axes, angleDeg);
        if (upper !== null) sum += Math.abs(upper - shown.upper) / u;
        if (lower !== null) sum += Math.abs(lower - shown.lower) / u;
      }
      if (sum < least) [least, best] = [sum, axes];
    }
  return best;
}
