import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { asLine, correctDifference, correctReading, inUnit } from "#app/gemmology/calibration/correction.ts";
import { fitCorrection, type ReferencePoint } from "#app/gemmology/calibration/fit-correction.ts";

/** A line through x and y, as readings x of references whose nominal is x + y. */
const through = (x: readonly number[], y: readonly number[], u: number): ReferencePoint[] => x.map((reading, at) => ({ reading, nominal: reading + y[at]!, uReading: u, uNominal: 0 }));

test("the worked example of ISO/TS 28037 clause 6, with equal weights", () => {
  // Data: the standard's supporting software, National Physical Laboratory. Results 1.867, 1.757, 0.465, 0.120, −0.050: from memory of the standard.
  const { correction, residuals, widening } = fitCorrection(through([1, 2, 3, 4, 5, 6], [3.3, 5.6, 7.1, 9.3, 10.7, 12.1], 0.5), "line");
  const { a, b } = asLine(correction);
  expect(a).toBeCloseTo(1.867, 3);
  expect(b).toBeCloseTo(1.757, 3);
  expect(Math.hypot(correction.uOffset, correction.uSlope * correction.centre)).toBeCloseTo(0.465, 3);
  expect(correction.uSlope).toBeCloseTo(0.12, 3);
  expect(-correction.centre * correction.uSlope ** 2).toBeCloseTo(-0.05, 3);
  expect(residuals.reduce((sum, one) => sum + (one / 0.5) ** 2, 0)).toBeCloseTo(1.665, 3);
  expect(widening).toBe(1);
});

test("the certified line of NIST's Norris, an ozone monitor's calibration", () => {
  // https://www.itl.nist.gov/div898/strd/lls/data/Norris.shtml; data and certified values.
  const x = [0.2, 337.4, 118.2, 884.6, 10.1, 226.5, 666.3, 996.3, 448.6, 777.0, 558.2, 0.4, 0.6, 775.5, 666.9, 338.0, 447.5, 11.6, 556.0, 228.1, 995.8, 887.6, 120.2, 0.3, 0.3, 556.8, 339.1, 887.2, 999.0, 779.0, 11.1, 118.3, 229.2, 669.1, 448.9, 0.5];
  const y = [0.1, 338.8, 118.1, 888.0, 9.2, 228.1, 668.5, 998.5, 449.1, 778.9, 559.2, 0.3, 0.1, 778.1, 668.8, 339.3, 448.9, 10.8, 557.7, 228.3, 998.0, 888.8, 119.6, 0.3, 0.6, 557.6, 339.3, 888.0, 998.5, 778.9, 10.2, 117.6, 228.9, 668.4, 449.2, 0.2];
  const { correction } = fitCorrection(through(x, y, 1e-3), "line");
  const { a, b } = asLine(correction);
  expect(a).toBeCloseTo(-0.262323073774029, 9);
  expect(b).toBeCloseTo(1.00211681802045, 11);
  // Its standard deviations are those of the scatter, as a fit whose points scatter by far more than they should widens to.
  expect(Math.hypot(correction.uOffset, correction.uSlope * correction.centre)).toBeCloseTo(0.232818234301152, 9);
  expect(correction.uSlope).toBeCloseTo(0.429796848199937e-3, 12);
});

test("an offset is the weighted mean of what is missing, known better from more checks", () => {
  const one = { reading: 1.5436, nominal: 1.544, uReading: 0.0015, uNominal: 0 };
  const { correction } = fitCorrection([one, { ...one, reading: 1.5434 }], "offset");
  expect(correction).toMatchObject({ model: "offset", slope: 0, uSlope: 0 });
  expect(correction.offset).toBeCloseTo(0.0005, 9);
  expect(correction.uOffset).toBeCloseTo(0.0015 / Math.SQRT2, 9);
  expect(correctReading(correction, 1.762)).toMatchObject({ value: expect.closeTo(1.7625, 9), added: expect.closeTo(0.0005, 9), u: correction.uOffset });
});

test("the reference's own uncertainty counts", () => {
  const { correction } = fitCorrection([{ reading: 5.001, nominal: 5, uReading: 0.003, uNominal: 0.004 }], "offset");
  expect(correction.uOffset).toBeCloseTo(0.005, 12);
});

describe("random scales", () => {
  const value = (min: number, max: number) => fc.double({ min, max, noNaN: true });
  const line = fc.record({ a: value(-0.01, 0.01), b: value(-0.05, 0.05), x: fc.uniqueArray(fc.integer({ min: 1300, max: 1900 }), { minLength: 2, maxLength: 12 }) });

  test("a line that the readings follow exactly is found exactly", () => {
    fc.assert(
      fc.property(line, ({ a, b, x }) => {
        const readings = x.map((one) => one / 1000);
        const { correction, residuals } = fitCorrection(through(readings, readings.map((one) => a + b * one), 0.0015), "line");
        for (const one of readings) expect(correctReading(correction, one).added).toBeCloseTo(a + b * one, 9);
        for (const residual of residuals) expect(residual).toBeCloseTo(0, 9);
      }),
    );
  });

  test("a difference of two corrected readings is the corrected difference, and a unit's factor changes nothing but the unit", () => {
    fc.assert(
      fc.property(line, value(1.3, 1.9), value(1.3, 1.9), ({ a, b, x }, low, high) => {
        const readings = x.map((one) => one / 1000);
        const { correction } = fitCorrection(through(readings, readings.map((one, at) => a + b * one + (at % 2) * 0.002), 0.0015), "line");
        const apart = correctReading(correction, high).value - correctReading(correction, low).value;
        expect(correctDifference(correction, high - low).value).toBeCloseTo(apart, 9);
        const inCarats = correctReading(inUnit(correction, 5), high * 5);
        expect(inCarats.value).toBeCloseTo(correctReading(correction, high).value * 5, 9);
        expect(inCarats.u).toBeCloseTo(correctReading(correction, high).u * 5, 9);
        // Known best among the references, worse away from them.
        expect(correctReading(correction, high).u).toBeGreaterThanOrEqual(correction.uOffset);
      }),
    );
  });
});

test("what cannot be worked out is said", () => {
  const one = { reading: 1.5436, nominal: 1.544, uReading: 0.0015, uNominal: 0 };
  expect(() => fitCorrection([], "offset")).toThrow(RangeError);
  expect(() => fitCorrection([one, { ...one, nominal: 1.55 }], "line")).toThrow("two different readings");
  expect(() => fitCorrection([{ ...one, uReading: 0 }], "offset")).toThrow(RangeError);
});
