import fc from "fast-check";
import { expect, test } from "vitest";
import type { MeasuredSpectrum } from "#app/gemmology/spectrum/measured-spectrum.ts";
import { prominencesOf } from "#app/gemmology/spectrum/prominences.ts";
import { spectrumPeaks } from "#app/gemmology/spectrum/spectrum-peaks.ts";

// SciPy 1.17, documentation of scipy.signal.peak_prominences, first example: a signal of two harmonics, 1000 points from 0 to 6π.
test("prominences are those that a published worked example gives", () => {
  const values = Array.from({ length: 1000 }, (_, at) => (at * 6 * Math.PI) / 999).map((x) => Math.sin(x) + 0.6 * Math.sin(2.6 * x));
  const published = [1.24159486, 0.47840168, 0.28470524, 3.10716793, 0.284603, 0.47822491, 2.48340261, 0.47822491];
  const found = prominencesOf(values).map(({ prominence }) => prominence);
  expect(found).toHaveLength(published.length);
  found.forEach((value, at) => expect(value).toBeCloseTo(published[at]!, 7));
});

// The same page's second example: peaks of equal height do not part each other.
test("a peak beside one of its own height reaches past it", () => {
  expect(prominencesOf([0, 1, 0, 3, 1, 3, 0, 4, 0]).find(({ at }) => at === 5)?.prominence).toBe(3);
});

/** By the definition, point by point: slow, and written without looking at the fast one. */
function slowProminences(values: readonly number[]) {
  const tops = values.flatMap((value, start) => {
    if (start === 0 || !(values[start - 1]! < value)) return [];
    let end = start;
    while (values[end + 1] === value) end++;
    return end + 1 < values.length && values[end + 1]! < value ? [{ start, end, value }] : [];
  });
  return tops.map(({ start, end, value }) => {
    let [left, right] = [value, value];
    for (let at = start; at >= 0 && values[at]! <= value; at--) left = Math.min(left, values[at]!);
    for (let at = end; at < values.length && values[at]! <= value; at++) right = Math.min(right, values[at]!);
    return { at: Math.floor((start + end) / 2), prominence: value - Math.max(left, right) };
  });
}
test("prominences are those of the definition, on any curve", () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 0, max: 12 }), { maxLength: 80 }), (values) => {
      expect(prominencesOf(values)).toEqual(slowProminences(values));
    }),
    { numRuns: 2_000, seed: 5 },
  );
});

const gauss = (x: number, { at, height, fwhm }: { at: number; height: number; fwhm: number }) => height * Math.exp(-4 * Math.LN2 * ((x - at) / fwhm) ** 2);
const bands = [
  { at: 410, height: 0.9, fwhm: 45 },
  { at: 550, height: 0.7, fwhm: 60 },
  { at: 694.3, height: 0.4, fwhm: 3 },
];
const absorbanceAt = (nm: number) => 0.2 + bands.reduce((sum, band) => sum + gauss(nm, band), 0);
const axis = Array.from({ length: 801 }, (_, at) => 350 + at * 0.5);
const spectrum = (more: Partial<MeasuredSpectrum>): MeasuredSpectrum => ({ format: "twoColumns", title: "", kind: "curve", xUnit: "nm", yUnit: "absorbance", isUnitAssumed: false, notes: [], xs: axis, ys: axis.map(absorbanceAt), ...more });

test.each([
  ["absorbance", spectrum({})],
  ["transmittance", spectrum({ yUnit: "transmittance", ys: axis.map((nm) => 10 ** -absorbanceAt(nm)) })],
  ["falling wavelengths", spectrum({ xs: axis.toReversed(), ys: axis.toReversed().map(absorbanceAt) })],
  ["wavenumbers", spectrum({ xUnit: "1/cm", xs: axis.map((nm) => 1e7 / nm) })],
  ["micrometres", spectrum({ xUnit: "um", xs: axis.map((nm) => nm / 1000) })],
])("two bands and a line are found where they were put, from %s", (_, measured) => {
  const peaks = spectrumPeaks(measured);
  expect(peaks.map(({ kind }) => kind)).toEqual(["band", "band", "line"]);
  peaks.forEach(({ nm, widthNm }, at) => {
    expect(Math.abs(nm - bands[at]!.at)).toBeLessThan(0.6);
    // A lone band falls to half its prominence at half its height; its neighbour's tail widens or narrows it a little.
    expect(Math.abs(widthNm! / bands[at]!.fwhm - 1)).toBeLessThan(0.1);
  });
});

test("noise is no peak, and moves the place of one by little", () => {
  let state = 12345;
  const random = () => (state = (state * 1103515245 + 12345) % 2 ** 31) / 2 ** 31 - 0.5;
  const noisy = spectrum({ ys: axis.map((nm) => absorbanceAt(nm) + 0.02 * random()) });
  const peaks = spectrumPeaks(noisy);
  expect(peaks).toHaveLength(3);
  peaks.forEach(({ nm }, at) => expect(Math.abs(nm - bands[at]!.at)).toBeLessThan(bands[at]!.fwhm / 20));
});

test("a band that lets no light through at all has its place in the middle", () => {
  const dark = spectrum({ yUnit: "transmittance", ys: axis.map((nm) => (Math.abs(nm - 550) <= 20 ? 0 : 0.8)) });
  expect(spectrumPeaks(dark)).toMatchObject([{ nm: 550, kind: "band" }]);
});

test("a flat curve and a slope have no peaks", () => {
  expect(spectrumPeaks(spectrum({ ys: axis.map(() => 0.3) }))).toEqual([]);
  expect(spectrumPeaks(spectrum({ ys: axis.map((nm) => nm / 1000) }))).toEqual([]);
});

test("the peaks of a table are offered as they are", () => {
  expect(spectrumPeaks(spectrum({ kind: "peakTable", xs: [468, 476, 694], ys: [0.1, 0.2, 0.9] })).map(({ nm }) => nm)).toEqual([468, 476, 694]);
});

test("a hundred thousand points are searched in less than half a second", () => {
  const xs = Array.from({ length: 100_000 }, (_, at) => 300 + at / 100);
  const measured = spectrum({ xs, ys: xs.map((x) => Math.sin(x * 40) + x / 500) });
  const startedAt = performance.now();
  spectrumPeaks(measured);
  expect(performance.now() - startedAt).toBeLessThan(500);
});
