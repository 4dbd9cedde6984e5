import { edgeIndices, upperVibrationDeg, type PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import type { RotationFacet, RotationReading } from "#app/gemmology/rotation/rotation-run.ts";
import { cross, unit, type Orientation, type Vector } from "#app/gemmology/rotation/vector.ts";

/** The crystal on a facet whose normal is given in crystal axes; rotation 0 points towards `zero` as far as the facet lets it. */
export function onFacet(normal: Vector, zero: Vector = Math.abs(normal[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0]): Orientation {
  const n = unit(normal);
  const along = zero[0] * n[0] + zero[1] * n[1] + zero[2] * n[2];
  const flat: Vector = [zero[0] - along * n[0], zero[1] - along * n[1], zero[2] - along * n[2]];
  const x = Math.hypot(...flat) > 1e-9 ? unit(flat) : onFacet(normal, [zero[1], zero[2], zero[0]]).map(([first]) => first) as unknown as Vector;
  const y = cross(n, x);
  return [0, 1, 2].map((i): Vector => [x[i]!, y[i]!, n[i]!]) as unknown as Orientation;
}

type Options = { u?: number; stepDeg?: number; throughDeg?: number; label?: string; noise?: () => number; polariserAtDeg?: readonly number[] };

/** What a facet of a crystal shows at even steps of rotation, with errors drawn by `noise` in standard uncertainties. */
export function aFacet(indices: PrincipalIndices, axes: Orientation, { u = 0.0005, stepDeg = 15, throughDeg = 180, label = "table", noise = () => 0, polariserAtDeg = [] }: Options = {}): RotationFacet {
  const readings: RotationReading[] = [];
  for (let angleDeg = 0; angleDeg < throughDeg; angleDeg += stepDeg) {
    const { upper, lower } = edgeIndices(indices, axes, angleDeg);
    const [one, other] = [upper + u * noise(), lower + u * noise()];
    const polariserDeg = polariserAtDeg.includes(angleDeg) ? upperVibrationDeg(indices, axes, angleDeg) + 6 * noise() : null;
    readings.push({ angleDeg, upper: Math.max(one, other), lower: Math.min(one, other), u, polariserDeg });
  }
  return { label, readings };
}

/** Seeded: mulberry32 for even numbers, Box and Muller for normal ones. */
export function randomFrom(seed: number) {
  let state = seed;
  const even = () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
  const normal = () => Math.sqrt(-2 * Math.log(even() + 1e-300)) * Math.cos(2 * Math.PI * even());
  return { even, normal };
}
