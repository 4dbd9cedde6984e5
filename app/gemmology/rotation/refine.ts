import { pseudoInverse } from "../linear/pseudo-inverse.ts";
import { solve } from "../linear/solve.ts";
import { mirrored, moved, parameterCount, residualsNear, shownOf, turnsOf, type Crystal, type Shown } from "./crystal-model.ts";
import type { Observed } from "./observed.ts";

export type Refined = Readonly<{
  crystal: Crystal;
  shown: Shown;
  /** Sum of squares, in which a residual beyond 2.5 standard uncertainties counts by its size only (Huber). */
  chiSquared: number;
  /** Of the free indices, in their order. */
  covariance: readonly (readonly number[])[];
}>;

const huber = 2.5;
const mostTurns = 40;

/**
 * Least squares by Levenberg and Marquardt on the exact edges, robust against single misreadings. Where the polariser was
 * read, the mirror image of the crystal that fits it better is taken: edges cannot tell the two apart.
 *
 * Source: Marquardt, J. SIAM 11 (1963) 431; Huber, Ann. Math. Stat. 35 (1964) 73.
 */
export function refine(start: Crystal, observed: Observed): Refined {
  const first = descend(inBetterMirror(start, observed), observed);
  const turned = inBetterMirror(first.crystal, observed);
  return turned === first.crystal ? first : descend(turned, observed);
}

function inBetterMirror(crystal: Crystal, observed: Observed): Crystal {
  let best = crystal;
  for (let facet = 0; facet < observed.facetCount; facet++) {
    const positions = observed.positions.filter((position) => position.facet === facet && position.polariserDeg !== null);
    if (positions.length === 0 || crystal.rank === 1) continue;
    const other = { ...best, axes: best.axes.map((axes, at) => (at === facet ? mirrored(axes) : axes)) };
    if (costOf(shownOf(other, { ...observed, positions }).residuals) < costOf(shownOf(best, { ...observed, positions }).residuals) - 1e-9) best = other;
  }
  return best;
}

function descend(start: Crystal, observed: Observed): Refined {
  let crystal = start;
  let shown = shownOf(crystal, observed);
  let cost = costOf(shown.residuals);
  let damping = 1e-3;
  for (let turn = 0; turn < mostTurns; turn++) {
    const { normal, gradient } = linearised(crystal, shown, observed);
    let isBetter = false;
    for (let tries = 0; tries < 8; tries++) {
      const step = damped(normal, gradient, damping, crystal.rank);
      const next = step && moved(crystal, step);
      if (next?.free.every((value) => value > 1 && value < 4)) {
        const nextShown = shownOf(next, observed);
        const nextCost = costOf(nextShown.residuals);
        if (nextCost < cost) {
          isBetter = cost - nextCost > 1e-5;
          [crystal, shown, cost] = [next, nextShown, nextCost];
          damping = Math.max(1e-9, damping / 8);
          break;
        }
      }
      damping *= 6;
    }
    if (!isBetter) break;
  }
  const { normal } = linearised(crystal, shown, observed);
  const covariance = pseudoInverse(normal).slice(0, crystal.rank).map((row) => row.slice(0, crystal.rank));
  return { crystal, shown, chiSquared: cost, covariance };
}

/** A step of damped normal equations, shortened where it would leave the neighbourhood; null where they have no solution. */
function damped(normal: readonly (readonly number[])[], gradient: readonly number[], damping: number, rank: number): number[] | null {
  let step: number[];
  try {
    step = solve(normal.map((row, i) => row.map((value, j) => (i === j ? value * (1 + damping) + 1e-9 * damping : value))), gradient);
  } catch {
    return null;
  }
  const largest = step.reduce((most, value, at) => Math.max(most, Math.abs(value) / (at < rank ? 0.05 : 0.5)), 0);
  return largest > 1 ? step.map((value) => value / largest) : step;
}

function costOf(residuals: readonly (readonly number[])[]): number {
  let sum = 0;
  for (const row of residuals)
    for (const value of row) {
      const size = Math.abs(value);
      sum += size <= huber ? value * value : 2 * huber * size - huber * huber;
    }
  return sum;
}

/** Normal equations JᵀWJ and JᵀWr, by differences at fixed tilts. */
function linearised(crystal: Crystal, shown: Shown, observed: Observed): { normal: number[][]; gradient: number[] } {
  const size = parameterCount(crystal);
  const columns = Array.from({ length: size }, (_, at) => {
    const isIndex = at < crystal.rank;
    const by = isIndex ? 1e-5 : 1e-4;
    const facet = isIndex || observed.facetCount === 1 ? null : Math.floor((at - crystal.rank) / turnsOf[crystal.rank]);
    const shifted = residualsNear(moved(crystal, Array.from({ length: size }, (_, other) => (other === at ? by : 0))), observed, shown, facet);
    const column: number[] = [];
    shown.residuals.forEach((row, position) => {
      row.forEach((value, k) => {
        const near = shifted[position]![k];
        const difference = near === undefined ? 0 : near - value;
        // An azimuth that passes the end of its half turn has not moved by a half turn.
        const isAzimuth = k === row.length - 1 && crystal.rank > 1 && observed.positions[position]!.polariserDeg !== null;
        column.push(isAzimuth && Math.abs(difference) > 5 ? 0 : -difference / by);
      });
    });
    return column;
  });
  const values = shown.residuals.flat();
  const weights = values.map((value) => (Math.abs(value) <= huber ? 1 : huber / Math.abs(value)));
  const normal = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const gradient = new Array<number>(size).fill(0);
  for (let i = 0; i < size; i++) {
    const left = columns[i]!;
    for (let row = 0; row < values.length; row++) gradient[i]! += left[row]! * weights[row]! * values[row]!;
    for (let j = i; j < size; j++) {
      const right = columns[j]!;
      let sum = 0;
      for (let row = 0; row < values.length; row++) sum += left[row]! * weights[row]! * right[row]!;
      normal[i]![j] = sum;
      normal[j]![i] = sum;
    }
  }
  return { normal, gradient };
}
