import { expect, test } from "vitest";
import { lightSpeedInsideKmS } from "#app/gemmology/optics/light-speed-inside-km-s.ts";
import { normalReflectance } from "#app/gemmology/optics/normal-reflectance.ts";
import { wavelengthInsideNm } from "#app/gemmology/optics/wavelength-inside-nm.ts";
import { workedOn } from "../worked-on.ts";

test.each(workedOn("Fresnel reflectance, normal incidence"))("$id: what one face reflects ($source)", ({ inputs, expected }) => {
  // Published to a tenth of a per cent; one source has 4.6 for an index given as 1.54, which is 4.5.
  expect(Math.abs(normalReflectance({ n: inputs.ri! }) * 100 - expected.reflectance_percent!)).toBeLessThanOrEqual(0.1);
});

// Fresnel at normal incidence worked out separately, by R = ((n − 1)/(n + 1))² in decimal arithmetic: 0.16/3.16 and so on.
test.each([
  [1.544, 4.57],
  [1.77, 7.73],
  [2.15, 13.33],
  [2.65, 20.44],
])("a face of index %s reflects %s per cent", (n, percent) => {
  expect(normalReflectance({ n }) * 100).toBeCloseTo(percent, 2);
});

test("a stone in a liquid of its own index reflects nothing", () => {
  expect(normalReflectance({ n: 1.74, nOutside: 1.74 })).toBe(0);
});

test.each(workedOn("speed of light from RI"))("$id: speed of light inside ($source)", ({ inputs, expected }) => {
  expect(Math.abs((lightSpeedInsideKmS({ n: inputs.ri! }) * 1000) / expected.v_m_s! - 1)).toBeLessThan(0.002);
});

// Turned round: the index follows from a published speed.
test.each(workedOn("RI from speed of light"))("$id: the index's speed is the published one ($source)", ({ inputs, expected }) => {
  const publishedKmS = inputs.v_km_s ?? inputs.v_m_s! / 1000;
  expect(Math.abs(lightSpeedInsideKmS({ n: expected.ri! }) / publishedKmS - 1)).toBeLessThan(0.004);
});

test("frequency is kept: speed over wavelength is the same inside and outside", () => {
  const outside = lightSpeedInsideKmS({ n: 1 }) / 589.3;
  expect(lightSpeedInsideKmS({ n: 2.417 }) / wavelengthInsideNm({ n: 2.417 })).toBeCloseTo(outside, 9);
});

test.each([0.99, 4.01, Number.NaN])("an index of %s is refused", (n) => {
  expect(() => normalReflectance({ n })).toThrow(RangeError);
  expect(() => lightSpeedInsideKmS({ n })).toThrow(RangeError);
  expect(() => wavelengthInsideNm({ n })).toThrow(RangeError);
});
