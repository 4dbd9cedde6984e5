import { expect, test } from "vitest";
import { edgeIndices, type PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { cross, dot, type Orientation, type Vector } from "#app/gemmology/rotation/vector.ts";
import { onFacet, randomFrom } from "./a-rotation-run.ts";

/**
 * Maxwell's equations for a wave k = (q, p, 0) in the facet's frame (s, N, t) hold where det(kkᵀ − k²·1 + ε) = 0: a quartic
 * in p (H. G. Booker, Quart. J. Mech. Appl. Math. 2 (1949), by name). As q rises past an edge, two of its real solutions
 * meet and vanish: no wave enters the stone on that sheet.
 */
function realWaves(indices: PrincipalIndices, axes: Orientation, angleDeg: number, q: number): number {
  const s: Vector = [Math.cos((angleDeg * Math.PI) / 180), Math.sin((angleDeg * Math.PI) / 180), 0];
  const normal: Vector = [0, 0, 1];
  const frame = [s, normal, cross(normal, s)];
  const permittivity = frame.map((a) => frame.map((b) => axes.reduce((sum, axis, at) => sum + indices[at]! ** 2 * dot(axis, a) * dot(axis, b), 0)));
  const determinant = (p: number) => {
    const k = [q, p, 0];
    const m = permittivity.map((row, i) => row.map((value, j) => value + k[i]! * k[j]! - (i === j ? q * q + p * p : 0)));
    return m[0]![0]! * (m[1]![1]! * m[2]![2]! - m[1]![2]! * m[2]![1]!) - m[0]![1]! * (m[1]![0]! * m[2]![2]! - m[1]![2]! * m[2]![0]!) + m[0]![2]! * (m[1]![0]! * m[2]![1]! - m[1]![1]! * m[2]![0]!);
  };
  let [changes, before] = [0, determinant(-0.6)];
  const steps = 24_000;
  for (let at = 1; at <= steps; at++) {
    const value = determinant(-0.6 + (1.2 * at) / steps);
    if (value > 0 !== before > 0) changes++;
    before = value;
  }
  return changes;
}

test("Maxwell's equations let no wave in beyond an edge, of random crystals on random facets", () => {
  const { even, normal } = randomFrom(41);
  let checked = 0;
  for (let turn = 0; turn < 40; turn++) {
    const alpha = 1.5 + 0.3 * even();
    const beta = alpha + 0.01 + 0.05 * even();
    const indices: PrincipalIndices = [alpha, beta, beta + 0.01 + 0.05 * even()];
    const [axes, angleDeg] = [onFacet([normal(), normal(), normal()]), 180 * even()];
    const { upper, lower } = edgeIndices(indices, axes, angleDeg);
    if (upper - lower < 0.005) continue;
    const by = 2e-6;
    expect([lower - by, lower + by, upper - by, upper + by].map((q) => realWaves(indices, axes, angleDeg, q))).toEqual([4, 2, 2, 0]);
    checked++;
  }
  expect(checked).toBeGreaterThan(30);
});
