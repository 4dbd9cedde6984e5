import fc from "fast-check";
import { expect, test } from "vitest";
import { mirrored } from "#app/gemmology/rotation/crystal-model.ts";
import { edgeIndices, sectionIndices, upperVibrationDeg, facetView, type PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { halfTurn } from "#app/gemmology/rotation/observed.ts";
import { crystalsOf, harmonicsOf } from "#app/gemmology/rotation/section-harmonics.ts";
import { twinsOf } from "#app/gemmology/rotation/twins-of.ts";
import { onFacet } from "./a-rotation-run.ts";

const aCrystal = fc.record({ alpha: fc.double({ min: 1.4, max: 2, noNaN: true }), first: fc.double({ min: 0.002, max: 0.06, noNaN: true }), second: fc.double({ min: 0.002, max: 0.06, noNaN: true }) }).map(({ alpha, first, second }): PrincipalIndices => [alpha, alpha + first, alpha + first + second]);
const aDirection = fc.tuple(fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true }), fc.double({ min: -1, max: 1, noNaN: true })).filter((v) => Math.hypot(...v) > 0.2);
const angles = Array.from({ length: 24 }, (_, at) => at * 7.5);

test("the twin of a crystal shows the same edges exactly, with another β", () => {
  let found = 0;
  fc.assert(
    fc.property(aCrystal, aDirection, (indices, normal) => {
      const axes = onFacet(normal);
      for (const twin of twinsOf({ indices, axes })) {
        expect(twin.indices[0]).toBeCloseTo(indices[0], 9);
        expect(twin.indices[2]).toBeCloseTo(indices[2], 9);
        let touching = 0;
        for (const angleDeg of angles) {
          const [own, other] = [edgeIndices(indices, axes, angleDeg), edgeIndices(twin.indices, twin.axes, angleDeg)];
          // Within about a degree of an optic axis the sheets meet in a point and the outline is no smooth maximum.
          if (own.upper - own.lower < 0.05 * (indices[2] - indices[0])) touching++;
          else for (const edge of ["upper", "lower"] as const) expect(Math.abs(other[edge] - own[edge])).toBeLessThan(1e-7);
        }
        expect(touching).toBeLessThan(8);
        found++;
      }
    }),
    { numRuns: 400, seed: 11 },
  );
  // None where the facet stands across an axis and both values of β are the same.
  expect(found).toBeGreaterThan(250);
});

test("a crystal is among those that have its own sections, by either tensor, near enough to begin from", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, fc.constantFrom(2 as const, -2 as const), (indices, normal, power) => {
      const crystals = crystalsOf(harmonicsOf({ indices, axes: onFacet(normal) }, power));
      expect(crystals.length).toBeGreaterThan(0);
      expect(Math.min(...crystals.map((each) => Math.max(...each.indices.map((n, at) => Math.abs(n - indices[at]!)))))).toBeLessThan(0.03 * (indices[2] - indices[0]));
    }),
    { numRuns: 400, seed: 12 },
  );
});

test("a mirror image has the same edges and vibrations on the other side of the normal", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, fc.double({ min: 0, max: 180, noNaN: true }), (indices, normal, angleDeg) => {
      const axes = onFacet(normal);
      const other = mirrored(axes);
      const [own, image] = [edgeIndices(indices, axes, angleDeg), edgeIndices(indices, other, angleDeg)];
      expect(image.upper).toBeCloseTo(own.upper, 9);
      expect(image.lower).toBeCloseTo(own.lower, 9);
      if (own.upper - own.lower > 1e-4) expect(halfTurn(upperVibrationDeg(indices, other, angleDeg) + upperVibrationDeg(indices, axes, angleDeg))).toBeCloseTo(0, 4);
    }),
    { numRuns: 300, seed: 13 },
  );
});

test("edges stand at or above the section's indices, by the square of the birefringence at most", () => {
  fc.assert(
    fc.property(aCrystal, aDirection, fc.double({ min: 0, max: 180, noNaN: true }), (indices, normal, angleDeg) => {
      const axes = onFacet(normal);
      const edges = edgeIndices(indices, axes, angleDeg);
      const [upper, lower] = sectionIndices(indices, facetView(axes, angleDeg).along);
      const bound = (indices[2] - indices[0]) ** 2;
      for (const [edge, section] of [[edges.upper, upper], [edges.lower, lower]] as const) {
        expect(edge - section).toBeGreaterThan(-1e-9);
        expect(edge - section).toBeLessThan(bound);
      }
    }),
    { numRuns: 300, seed: 14 },
  );
});
