import { solve } from "../linear/solve.ts";
import { symmetricEigen } from "../linear/symmetric-eigen.ts";
import type { PrincipalIndices } from "./edge-indices.ts";
import { cross, type Orientation, type Vector } from "./vector.ts";

export type Start = Readonly<{ indices: PrincipalIndices; axes: Orientation }>;
type Pair = Readonly<{ angleDeg: number; upper: number; lower: number }>;

/**
 * The crystals, at most two, whose sections give the edges of one facet: sum and product of 1/U² and 1/L² hold only 0 and
 * 2φ harmonics, from which the impermeability tensor follows once its component along the normal is known, and that has
 * two admissible values.
 *
 * @param pairs positions at which both edges were read; at least three of them apart within a half turn
 * @returns no start where the positions do not suffice
 */
export function algebraicStart(pairs: readonly Pair[]): Start[] {
  const apart = new Set(pairs.map(({ angleDeg }) => Math.round((((angleDeg % 180) + 180) % 180) * 10)));
  if (apart.size < 3) return [];
  const middle = pairs.reduce((sum, { upper, lower }) => sum + upper ** -2 + lower ** -2, 0) / (2 * pairs.length);
  const [s0, sc, ss] = harmonics(pairs, ({ upper, lower }) => upper ** -2 - middle + (lower ** -2 - middle));
  const [p0, pc, ps] = harmonics(pairs, ({ upper, lower }) => (upper ** -2 - middle) * (lower ** -2 - middle));
  const w = (a: number) => a * (s0 - a) - p0;
  const g = (a: number) => w(a) - Math.hypot(a * sc - pc, a * ss - ps);

  return roots(g, { around: s0 / 2, width: Math.max(1e-6, ...pairs.map(({ upper, lower }) => Math.max(Math.abs(upper ** -2 - middle), Math.abs(lower ** -2 - middle)))) * 4 }).flatMap((a) => {
    const m = s0 - a;
    const dc = a * sc - pc;
    const p = Math.sqrt(Math.max(0, w(a) - dc));
    const q = Math.sqrt(Math.max(0, w(a) + dc)) * Math.sign(ps - a * ss || 1);
    const { values, vectors } = symmetricEigen([
      [m - sc + middle, -ss, p],
      [-ss, m + sc + middle, q],
      [p, q, a + middle],
    ]);
    if (values.some((value) => !(value > 0))) return [];
    // The largest impermeability is the smallest index.
    const [z, y, x] = vectors as unknown as [Vector, Vector, Vector];
    const indices: PrincipalIndices = [values[2]! ** -0.5, values[1]! ** -0.5, values[0]! ** -0.5];
    return [{ indices, axes: [x, y, Math.sign(cross(x, y)[0] * z[0] + cross(x, y)[1] * z[1] + cross(x, y)[2] * z[2]) < 0 ? [-z[0], -z[1], -z[2]] : z] as Orientation }];
  });
}

/** Least squares on 1, cos 2φ, sin 2φ. */
function harmonics(pairs: readonly Pair[], of: (pair: Pair) => number): [number, number, number] {
  const normal = Array.from({ length: 3 }, () => [0, 0, 0]);
  const right = [0, 0, 0];
  for (const pair of pairs) {
    const twice = (2 * pair.angleDeg * Math.PI) / 180;
    const row = [1, Math.cos(twice), Math.sin(twice)];
    const value = of(pair);
    for (let i = 0; i < 3; i++) {
      right[i]! += row[i]! * value;
      for (let j = 0; j < 3; j++) normal[i]![j]! += row[i]! * row[j]!;
    }
  }
  return solve(normal, right) as [number, number, number];
}

/** The two zeros of a function that falls like a parabola from its top, by scan and bisection. */
function roots(g: (a: number) => number, { around, width }: { around: number; width: number }): number[] {
  const steps = 400;
  const at = (k: number) => around - width + (2 * width * k) / steps;
  const found: number[] = [];
  let best = 0;
  let previous = g(at(0));
  let highest = previous;
  for (let k = 1; k <= steps; k++) {
    const value = g(at(k));
    if (value > highest) [highest, best] = [value, k];
    if (value * previous < 0) {
      let [low, high] = [at(k - 1), at(k)];
      const isRising = value > 0;
      for (let turn = 0; turn < 60; turn++) {
        const half = (low + high) / 2;
        if (g(half) > 0 === isRising) high = half;
        else low = half;
      }
      found.push((low + high) / 2);
    }
    previous = value;
  }
  if (found.length > 1) return found;
  // Noise has lifted the two roots off the axis, or merged them: one to each side, as far as the noise would carry them.
  const middle = found[0] ?? at(best);
  const apart = Math.max(Math.sqrt(Math.abs(highest)), width / steps);
  return [middle - apart, middle + apart];
}
