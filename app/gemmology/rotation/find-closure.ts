import type { Misfit } from "./rotation-fit.ts";
import type { RotationRun } from "./rotation-run.ts";

const most = 3;

/** Edges must repeat after a half turn: where they do not, the seat or the facet is at fault. */
export function findClosure({ facets }: RotationRun): Misfit[] {
  return facets.flatMap(({ label, readings }) =>
    readings.flatMap((first, at) =>
      readings.slice(at + 1).flatMap((second): Misfit[] => {
        const apart = (((second.angleDeg - first.angleDeg) % 360) + 360) % 360;
        if (Math.abs(apart - 180) > 1) return [];
        return (["upper", "lower"] as const).flatMap((edge): Misfit[] => {
          const [before, after] = [first[edge], second[edge]];
          if (before === null || after === null) return [];
          const by = (after - before) / Math.hypot(first.u, second.u);
          if (Math.abs(by) <= most) return [];
          return [{ facet: label, angleDeg: second.angleDeg, edge, by, message: `the ${edge} edge at ${second.angleDeg}° doesn't repeat that at ${first.angleDeg}°: ${Math.abs(by).toFixed(1)} u apart; seat the stone anew` }];
        });
      }),
    ),
  );
}
