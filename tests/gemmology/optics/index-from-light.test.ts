import fc from "fast-check";
import { expect, test } from "vitest";
import { apparentDepthMm } from "#app/gemmology/optics/apparent-depth-mm.ts";
import { indexFromDepths } from "#app/gemmology/optics/index-from-depths.ts";
import { indexFromReflectance } from "#app/gemmology/optics/index-from-reflectance.ts";
import { normalReflectance } from "#app/gemmology/optics/normal-reflectance.ts";
import { refractionAngleDeg } from "#app/gemmology/optics/refraction-angle-deg.ts";
import { workedOn } from "../worked-on.ts";

test.each(workedOn("apparent depth"))("$id: apparent depth ($source)", ({ inputs, expected }) => {
  expect(apparentDepthMm({ realMm: inputs.real_depth!, n: inputs.n_object_side!, nObserver: inputs.n_observer! })).toBeCloseTo(expected.apparent_depth!, 3);
});

test("4.12 mm that look like 2.33 mm mean 1.768 ± 0.017", () => {
  const { n, u } = indexFromDepths({ realMm: 4.12, apparentMm: 2.33 });
  expect(n).toBeCloseTo(1.768, 3);
  expect(u).toBeCloseTo(0.0174, 4);
});

test("an objective of aperture 0.12 reads corundum 0.009 high at most", () => {
  const [n, na] = [1.77, 0.12];
  // What rays at the edge of the aperture show: √(n² − NA²)/√(1 − NA²) = 1.7788.
  const seen = Math.sqrt(n ** 2 - na ** 2) / Math.sqrt(1 - na ** 2);
  expect(seen).toBeCloseTo(1.7788, 4);
  const found = indexFromDepths({ realMm: seen, apparentMm: 1, numericalAperture: na });
  expect(found.n - found.readsHighByAtMost).toBeCloseTo(n, 10);
});

test("the aperture's bias is that of a ray traced by Snell's law at its edge", () => {
  fc.assert(
    fc.property(fc.double({ min: 1.3, max: 2.7, noNaN: true }), fc.double({ min: 0.01, max: 0.6, noNaN: true }), (n, numericalAperture) => {
      const outsideDeg = (Math.asin(numericalAperture) * 180) / Math.PI;
      const insideDeg = refractionAngleDeg({ n1: 1, n2: n, incidenceDeg: outsideDeg })!;
      const apparentMm = Math.tan((insideDeg * Math.PI) / 180) / Math.tan((outsideDeg * Math.PI) / 180);
      const found = indexFromDepths({ realMm: 1, apparentMm, numericalAperture });
      expect(found.n - found.readsHighByAtMost).toBeCloseTo(n, 8);
    }),
  );
});

test("17.19 per cent from one face mean 2.417, and half a per cent of doubt 0.035 of index", () => {
  const { n, u } = indexFromReflectance({ reflectance: 0.1719, uReflectance: 0.005 });
  expect(n).toBeCloseTo(2.417, 3);
  expect(u).toBeCloseTo(0.0352, 3);
});

test.each(workedOn("Fresnel reflectance, normal incidence"))("$id: the index of a published reflectance ($source)", ({ inputs, expected }) => {
  expect(Math.abs(indexFromReflectance({ reflectance: expected.reflectance_percent! / 100 }).n - inputs.ri!)).toBeLessThan(0.012);
});

test("reflectance and index go both ways, and the uncertainty is the slope", () => {
  fc.assert(
    fc.property(fc.double({ min: 1.05, max: 3.9, noNaN: true }), (n) => {
      const reflectance = normalReflectance({ n });
      const found = indexFromReflectance({ reflectance, uReflectance: 1 });
      expect(found.n).toBeCloseTo(n, 8);
      const step = 1e-6 * reflectance;
      const slope = (indexFromReflectance({ reflectance: reflectance + step }).n - indexFromReflectance({ reflectance: reflectance - step }).n) / (2 * step);
      expect(found.u / slope).toBeCloseTo(1, 4);
    }),
  );
});

test.each([
  ["reflectance", () => indexFromReflectance({ reflectance: 1 })],
  ["reflectance", () => indexFromReflectance({ reflectance: 17.2 })],
  ["n", () => indexFromReflectance({ reflectance: 0.5 })],
  ["apparentMm", () => indexFromDepths({ realMm: 2, apparentMm: 2.1 })],
  ["realMm", () => indexFromDepths({ realMm: 0, apparentMm: 0 })],
  ["n", () => indexFromDepths({ realMm: 5, apparentMm: 1 })],
  ["numericalAperture", () => indexFromDepths({ realMm: 2, apparentMm: 1, numericalAperture: 1 })],
  ["realMm", () => apparentDepthMm({ realMm: -1, n: 1.5 })],
])("%s outside its range is refused by name", (name, call) => {
  expect(call).toThrow(new RegExp(`^${name} out of range`));
  expect(call).toThrow(RangeError);
});
