import fc from "fast-check";
import { expect, test } from "vitest";
import { expectedDensityU, uselessDensityU } from "#app/gemmology/density/expected-density-u.ts";
import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";

// Worked out separately for the project's formulas, §8.5.
test.each([[2.65, 0.25, 0.115, 0.353], [2.65, 1, 0.029, 0.088], [4, 0.5, 0.133, 0.41], [4, 1, 0.067, 0.205], [4, 10, 0.007, 0.021]])("a stone of %s and %s ct has its density to so much", (sg, massCt, fine, coarse) => {
  expect(Math.abs(expectedDensityU({ massCt, sg, uAirCt: 0.0015, uWaterCt: 0.004 }) - fine)).toBeLessThan(0.002);
  expect(Math.abs(expectedDensityU({ massCt, sg, uAirCt: 0.006, uWaterCt: 0.012 }) - coarse)).toBeLessThan(0.005);
});

test("a quarter carat is too small to be weighed in water", () => {
  expect(expectedDensityU({ massCt: 0.25, sg: 3.5, uAirCt: 0.0015, uWaterCt: 0.004 })).toBeGreaterThan(uselessDensityU);
});

test("what is expected before a weighing is what the weighing then states", () => {
  fc.assert(
    fc.property(fc.double({ min: 0.3, max: 20, noNaN: true }), fc.double({ min: 1.5, max: 6.5, noNaN: true }), (massCt, sg) => {
      const stated = hydrostaticDensity({ method: "suspended", massAirCt: massCt, massLiquidCt: massCt * (1 - 0.9982 / sg), tempC: 20, uMassAirCt: 0.0015, uMassLiquidCt: 0.004 }).uSg;
      expect(expectedDensityU({ massCt, sg, uAirCt: 0.0015, uWaterCt: 0.004 }) / stated).toBeCloseTo(1, 1);
    }),
  );
});
