import { edgeIndices, upperVibrationDeg, type PrincipalIndices } from "./edge-indices.ts";
import { polariserUDeg, type RotationRun } from "./rotation-run.ts";
import { turned, type Orientation } from "./vector.ts";

/** How many different principal indices: 1 isotropic, 2 uniaxial (along axes 1 and 2, then 3), 3 biaxial. */
export type Rank = 1 | 2 | 3;
export type Crystal = Readonly<{ rank: Rank; free: readonly number[]; axes: readonly Orientation[] }>;
export type EdgeName = "upper" | "lower" | "polariser";
export type Residual = Readonly<{ facet: number; reading: number; edge: EdgeName; /** Observed less computed, in standard uncertainties. */ value: number; u: number }>;

/** A uniaxial crystal does not change when it turns about its axis, an isotropic one in no way. */
const turnsOf: Readonly<Record<Rank, number>> = { 1: 0, 2: 2, 3: 3 };

export const principalOf = ({ rank, free }: Pick<Crystal, "rank" | "free">): PrincipalIndices => (rank === 1 ? [free[0]!, free[0]!, free[0]!] : rank === 2 ? [free[0]!, free[0]!, free[1]!] : [free[0]!, free[1]!, free[2]!]);
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

/** What was read against what the crystal would show, every edge and azimuth once, always in the same order. */
export function residualsOf(crystal: Crystal, { facets }: RotationRun): Residual[] {
  const indices = principalOf(crystal);
  const residuals: Residual[] = [];
  facets.forEach(({ readings }, facet) => {
    const axes = crystal.axes[facet]!;
    readings.forEach(({ angleDeg, upper, lower, u, polariserDeg }, reading) => {
      const shown = edgeIndices(indices, axes, angleDeg);
      if (upper !== null) residuals.push({ facet, reading, edge: "upper", value: (upper - shown.upper) / u, u });
      if (lower !== null) residuals.push({ facet, reading, edge: "lower", value: (lower - shown.lower) / u, u });
      if (polariserDeg !== null && crystal.rank > 1) residuals.push({ facet, reading, edge: "polariser", value: halfTurn(polariserDeg - upperVibrationDeg(indices, axes, angleDeg)) / polariserUDeg, u: polariserUDeg });
    });
  });
  return residuals;
}

/** A difference of directions without arrow: −90° up to 90°. */
export function halfTurn(deg: number): number {
  const folded = ((deg % 180) + 180) % 180;
  return folded > 90 ? folded - 180 : folded;
}
