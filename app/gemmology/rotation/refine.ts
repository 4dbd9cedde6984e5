import { pseudoInverse } from "../linear/pseudo-inverse.ts";
import { solve } from "../linear/solve.ts";
import { moved, parameterCount, residualsOf, type Crystal, type Residual } from "./crystal-model.ts";
import type { RotationRun } from "./rotation-run.ts";

export type Refined = Readonly<{
  crystal: Crystal;
  residuals: readonly Residual[];
  /** Sum of squares, in which a residual beyond 2.5 standard uncertainties counts by its size only (Huber). */
  chiSquared: number;
  /** Of the free indices, in their order. */
  covariance: readonly (readonly number[])[];
}>;

const huber = 2.5;
const mostTurns = 40;

/**
 * Least squares by Levenberg and Marquardt on the exact edges, robust against single misreadings.
 *
 * Source: Marquardt, J. SIAM 11 (1963) 431; Huber, Ann. Math. Stat. 35 (1964) 73.
 */
export function refine(start: Crystal, run: RotationRun): Refined {
  let crystal = start;
  let residuals = residualsOf(crystal, run);
  let cost = costOf(residuals);
  let damping = 1e-3;
  for (let turn = 0; turn < mostTurns; turn++) {
    const { normal, gradient } = linearised(crystal, residuals, run);
    let isBetter = false;
    for (let tries = 0; tries < 8; tries++) {
      const damped = normal.map((row, i) => row.map((value, j) => (i === j ? value * (1 + damping) + 1e-9 * damping : value)));
      let step: number[];
      try {
        step = solve(damped, gradient);
      } catch {
        damping *= 10;
        continue;
      }
      const largest = step.reduce((most, value, at) => Math.max(most, Math.abs(value) / (at < crystal.rank ? 0.05 : 0.5)), 0);
      if (largest > 1) step = step.map((value) => value / largest);
      const next = moved(crystal, step);
      const nextResiduals = next.free.every((value) => value > 1 && value < 4) ? residualsOf(next, run) : [];
      const nextCost = nextResiduals.length > 0 ? costOf(nextResiduals) : Number.POSITIVE_INFINITY;
      if (nextCost < cost) {
        const gain = cost - nextCost;
        crystal = next;
        residuals = nextResiduals;
        cost = nextCost;
        damping = Math.max(1e-9, damping / 8);
        isBetter = gain > 1e-6 * (1 + cost);
        break;
      }
      damping *= 6;
    }
    if (!isBetter) break;
  }
  const { normal } = linearised(crystal, residuals, run);
  const covariance = pseudoInverse(normal).slice(0, crystal.rank).map((row) => row.slice(0, crystal.rank));
  return { crystal, residuals, chiSquared: cost, covariance };
}

function costOf(residuals: readonly Residual[]): number {
  let sum = 0;
  for (const { value } of residuals) {
    const size = Math.abs(value);
    sum += size <= huber ? value * value : 2 * huber * size - huber * huber;
  }
  return sum;
}

/** Normal equations JᵀWJ and JᵀWr by differences. */
function linearised(crystal: Crystal, residuals: readonly Residual[], run: RotationRun): { normal: number[][]; gradient: number[] } {
  const size = parameterCount(crystal);
  const columns = Array.from({ length: size }, (_, at) => {
    const by = at < crystal.rank ? 1e-5 : 1e-4;
    const shifted = residualsOf(moved(crystal, Array.from({ length: size }, (_, other) => (other === at ? by : 0))), run);
    return shifted.map(({ value, edge }, row) => {
      const difference = value - residuals[row]!.value;
      // An azimuth that passes the end of its half turn has not moved by a half turn.
      return edge === "polariser" && Math.abs(difference) > 5 ? 0 : -difference / by;
    });
  });
  const weights = residuals.map(({ value }) => (Math.abs(value) <= huber ? 1 : huber / Math.abs(value)));
  const normal = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const gradient = new Array<number>(size).fill(0);
  for (let i = 0; i < size; i++) {
    const [left] = [columns[i]!];
    for (let row = 0; row < residuals.length; row++) gradient[i]! += left[row]! * weights[row]! * residuals[row]!.value;
    for (let j = i; j < size; j++) {
      const right = columns[j]!;
      let sum = 0;
      for (let row = 0; row < residuals.length; row++) sum += left[row]! * weights[row]! * right[row]!;
      normal[i]![j] = sum;
      normal[j]![i] = sum;
    }
  }
  return { normal, gradient };
}
