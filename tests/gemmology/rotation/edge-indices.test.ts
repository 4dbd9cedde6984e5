import fc from "fast-check";
import { expect, test } from "vitest";
import worked from "#fixtures/worked/rotation-examples.json" with { type: "json" };
import { edgeIndices, sectionIndices, upperVibrationDeg, type PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { halfTurn } from "#app/gemmology/rotation/observed.ts";
import { dot, type Vector } from "#app/gemmology/rotation/vector.ts";
import { onFacet } from "./a-rotation-run.ts";

test("nine facets are there, with twelve rotations each", () => {
  expect(worked.examples).toHaveLength(9);
  for (const { readings } of worked.examples) expect(readings).toHaveLength(12);
});

// Source: fixtures/worked/rotation-examples.json, checked there against Booker's quartic.
test.each(worked.examples)("$name: both edges and the vibration at every rotation", ({ indices, normal, zeroTowards, readings }) => {
  const axes = onFacet(normal as unknown as Vector, zeroTowards as unknown as Vector);
  for (const { angleDeg, upper, lower, upperVibrationDeg: vibration } of readings) {
    const shown = edgeIndices(indices as unknown as PrincipalIndices, axes, angleDeg);
    expect(shown.upper).toBeCloseTo(upper, 4 - 0.31); // printed to four decimals
    expect(shown.lower).toBeCloseTo(lower, 4 - 0.31);
    // Where the edges touch no vibration is better than another.
    if (upper - lower > 0.0005) expect(Math.abs(halfTurn(upperVibrationDeg(indices as unknown as PrincipalIndices, axes, angleDeg) - vibration))).toBeLessThan(0.4);
  }
});

const aCrystal = fc.record({ alpha: fc.double({ min: 1.4, max: 2, noNaN: true }), first: fc.double({ min: 0.001, max: 0.06, noNaN: true }), second: fc.double({ min: 0.001, max: 0.06, noNaN: true }) }).map(({ alpha, first, second }): PrincipalIndices => [alpha, alpha + first, alpha + first + second]);
const aDirection = fc.tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true })).filter((v) => Math.hypot(...v) > 0.2);

test("over a rotation the highest upper edge is γ and the lowest lower edge is α, on every facet (theorem T1)", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, (indices, normal) => {
      const axes = onFacet(normal);
      // s stands across Z, or across X.
      const at = (axis: Vector) => (Math.atan2(axis[0], -axis[1]) * 180) / Math.PI;
      if (Math.hypot(axes[2][0], axes[2][1]) > 0.02) expect(edgeIndices(indices, axes, at(axes[2])).upper).toBeCloseTo(indices[2], 6);
      if (Math.hypot(axes[0][0], axes[0][1]) > 0.02) expect(edgeIndices(indices, axes, at(axes[0])).lower).toBeCloseTo(indices[0], 6);
    }),
    { numRuns: 300, seed: 4 },
  );
});

test("a half turn changes nothing, and the edges never leave the indices (T6)", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, fc.double({ min: 0, max: 180, noNaN: true }), (indices, normal, angleDeg) => {
      const axes = onFacet(normal);
      const [here, there] = [edgeIndices(indices, axes, angleDeg), edgeIndices(indices, axes, angleDeg + 180)];
      expect(there.upper).toBeCloseTo(here.upper, 7);
      expect(there.lower).toBeCloseTo(here.lower, 7);
      expect(here.lower).toBeGreaterThanOrEqual(indices[0] - 1e-9);
      expect(here.upper).toBeLessThanOrEqual(indices[2] + 1e-9);
    }),
    { numRuns: 300, seed: 5 },
  );
});

test("a uniaxial crystal's moving edge follows its closed form, calcite included", () => {
  const [omega, epsilon] = [1.6584, 1.4864]; // calcite
  for (const lean of [0.2, 0.7, 1.1, 1.5]) {
    const axes = onFacet([Math.sin(lean), 0, Math.cos(lean)]);
    for (let angleDeg = 0; angleDeg < 180; angleDeg += 10) {
      const s: Vector = [Math.cos((angleDeg * Math.PI) / 180), Math.sin((angleDeg * Math.PI) / 180), 0];
      const [cs, cn] = [dot(axes[2], s), axes[2][2]];
      const ae = epsilon ** -2;
      const d = omega ** -2 - ae;
      const moving = Math.sqrt((ae + d * cn ** 2) / (ae * (ae + d * (cs ** 2 + cn ** 2))));
      const { upper, lower } = edgeIndices([omega, omega, epsilon], axes, angleDeg);
      expect(lower).toBeCloseTo(moving, 6);
      expect(upper).toBeCloseTo(omega, 6);
    }
  }
});

test("a section's indices solve Fresnel's equation", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, (indices, direction) => {
      const length = Math.hypot(...direction);
      const w = direction.map((each) => each / length) as unknown as Vector;
      for (const n of sectionIndices(indices, w)) {
        const x = n ** -2;
        const product = indices.map((each) => x - each ** -2);
        // Σ wᵢ² / (x − aᵢ) = 0, multiplied out so that nothing is divided by zero
        const sum = w[0] ** 2 * product[1]! * product[2]! + w[1] ** 2 * product[0]! * product[2]! + w[2] ** 2 * product[0]! * product[1]!;
        expect(Math.abs(sum)).toBeLessThan(1e-12);
      }
    }),
    { numRuns: 300, seed: 6 },
  );
});
