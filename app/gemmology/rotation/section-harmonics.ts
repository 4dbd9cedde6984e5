import { symmetricEigen } from "../linear/symmetric-eigen.ts";
import type { PrincipalIndices } from "./edge-indices.ts";
import { cross, type Orientation, type Vector } from "./vector.ts";

/** A crystal on one facet to begin a fit from. */
export type Start = Readonly<{ indices: PrincipalIndices; axes: Orientation }>;

/**
 * A tensor of the crystal: its principal values are n² (permittivity) or n⁻² (impermeability). Across a direction in the
 * facet it has two values in the plane; over the rotation φ, their sum s and product p, both values less `middle`, hold a
 * constant and the harmonics cos 2φ and sin 2φ only.
 */
export type SectionHarmonics = Readonly<{ power: 2 | -2; middle: number; s: readonly [number, number, number]; p: readonly [number, number, number] }>;

/** The harmonics that a crystal's sections have. */
export function harmonicsOf({ indices, axes }: Start, power: 2 | -2): SectionHarmonics {
  const a = indices.map((n) => n ** power);
  const middle = (a[0]! + a[1]! + a[2]!) / 3;
  const component = (i: number, j: number) => axes.reduce((sum, axis, at) => sum + (a[at]! - middle) * axis[i]! * axis[j]!, 0);
  const [uu, vv, uv, p, q, along] = [component(0, 0), component(1, 1), component(0, 1), component(0, 2), component(1, 2), component(2, 2)];
  const m = (uu + vv) / 2;
  const [sc, ss] = [m - uu, -uv];
  return { power, middle, s: [along + m, sc, ss], p: [along * m - (p * p + q * q) / 2, along * sc - (q * q - p * p) / 2, p * q + along * ss] };
}

/** The crystals, at most two, whose sections have these harmonics: the tensor follows once its component along the normal is known, and that has two admissible values. */
export function crystalsOf({ power, middle, s: [s0, sc, ss], p: [p0, pc, ps] }: SectionHarmonics): Start[] {
  const w = (a: number) => a * (s0 - a) - p0;
  const g = (a: number) => w(a) - Math.hypot(a * sc - pc, a * ss - ps);
  // w has its top at s0/2 and falls below zero at this distance from it; the admissible values lie within.
  const width = Math.max(1e-7, Math.sqrt(Math.max(0, (s0 / 2) ** 2 - p0)) * 1.05);
  return roots(g, { around: s0 / 2, width }).flatMap((a): Start[] => {
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
    const [[alpha, x], [beta, y], [gamma, z]] = values.map((value, at) => [value ** (1 / power), vectors[at]!] as const).sort(([one], [other]) => one - other) as unknown as readonly [readonly [number, Vector], readonly [number, Vector], readonly [number, Vector]];
    const upright = cross(x, y);
    const isRightHanded = upright[0] * z[0] + upright[1] * z[1] + upright[2] * z[2] >= 0;
    return [{ indices: [alpha, beta, gamma], axes: [x, y, isRightHanded ? z : [-z[0], -z[1], -z[2]]] }];
  });
}

/** The two zeros of a function that falls like a parabola from its top, by scan and bisection. */
function roots(g: (a: number) => number, { around, width }: { around: number; width: number }): number[] {
  const steps = 200;
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
      for (let turn = 0; turn < 50; turn++) {
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
