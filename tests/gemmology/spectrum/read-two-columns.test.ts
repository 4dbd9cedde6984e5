import fc from "fast-check";
import { expect, test } from "vitest";
import type { AssumedUnits, MeasuredSpectrum } from "#app/gemmology/spectrum/measured-spectrum.ts";
import { readSpectrumFile } from "#app/gemmology/spectrum/read-spectrum-file.ts";
import { xUnitNamed, yUnitNamed } from "#app/gemmology/spectrum/spectrum-units.ts";

const assumed: AssumedUnits = { xUnit: "nm", yUnit: "transmittance" };
function read(text: string): MeasuredSpectrum {
  const result = readSpectrumFile(text, assumed);
  if (!result.ok) throw new Error(`line ${result.problem.line}: ${result.problem.message}`);
  return result.spectrum;
}
function refusal(text: string): string {
  const result = readSpectrumFile(text, assumed);
  if (result.ok) throw new Error("was read");
  return `${result.problem.line ?? "file"}: ${result.problem.message}`;
}

const xs = [400, 400.5, 401, 401.5, 402];
const ys = [0.1, 0.25, 0.3, 0.25, 0.125];
const lines = (join: (x: string, y: string) => string, mark = ".") => xs.map((x, at) => join(String(x).replace(".", mark), String(ys[at]).replace(".", mark))).join("\r\n");

test.each([
  ["a comma", lines((x, y) => `${x},${y}`)],
  ["a comma and a blank", lines((x, y) => `${x}, ${y}`)],
  ["a semicolon", lines((x, y) => `${x};${y}`)],
  ["a semicolon, decimal comma", lines((x, y) => `${x};${y}`, ",")],
  ["a tab", lines((x, y) => `${x}\t${y}`)],
  ["a tab, decimal comma", lines((x, y) => `${x}\t${y}`, ",")],
  ["blanks", lines((x, y) => `  ${x}   ${y}`)],
  ["blanks, decimal comma", lines((x, y) => `${x} ${y}`, ",")],
  ["quotation marks", lines((x, y) => `"${x}";"${y}"`, ",")],
  ["a separator at the end of every line", lines((x, y) => `${x};${y};`)],
])("columns apart by %s are read", (_, text) => {
  const spectrum = read(text);
  expect(spectrum.xs).toEqual(xs);
  expect(spectrum.ys).toEqual(ys);
  expect(spectrum).toMatchObject({ format: "twoColumns", xUnit: "nm", yUnit: "transmittance", isUnitAssumed: true });
});

test("units are taken from the names above the columns, and the first line of a head is a title", () => {
  const spectrum = read(`Pink oval, table\nIntegration;120 ms\nWavenumber (cm⁻¹);Absorbance\n${[25000, 24000, 23000, 22000, 21000].map((x, at) => `${x};${at / 10}`).join("\n")}\n`);
  expect(spectrum).toMatchObject({ title: "Pink oval, table", xUnit: "1/cm", yUnit: "absorbance", isUnitAssumed: false });
});

test.each([
  ["Wavelength [nm]", "nm"],
  ["nm", "nm"],
  ["WAVENUMBERS (cm-1)", "1/cm"],
  ["1/CM", "1/cm"],
  ["cm^-1", "1/cm"],
  ["Wavelength (µm)", "um"],
  ["MICROMETERS", "um"],
  ["Spectrum", undefined],
  ["Date", undefined],
])("an axis named %s counts %s", (name, unit) => {
  expect(xUnitNamed(name)).toBe(unit);
});

test.each([
  ["%T", "transmittance"],
  ["T (%)", "transmittance"],
  ["Transmission", "transmittance"],
  ["Abs.", "absorbance"],
  ["A", "absorbance"],
  ["Reflectance [%]", "reflectance"],
  ["Counts", "arbitrary"],
  ["ARBITRARY UNITS", "arbitrary"],
  ["Channel 1", undefined],
])("a column named %s holds %s", (name, unit) => {
  expect(yUnitNamed(name)).toBe(unit);
});

test.each([
  ["a word among the numbers", "400;1\n401;2\n402;none\n403;1\n404;2", "3: “none” is no number."],
  ["NaN", "400;1\n401;NaN\n402;1\n403;1\n404;2", "2: “NaN” is no number."],
  ["a third column", "400;1;2\n401;2;3", "1: 3 columns stand here"],
  ["a third column further down", "400;1\n401;2\n402;2;3", "3: 3 columns stand here"],
  ["decimal commas between commas", "400,5,0,25\n401,5,0,3", "1: Four numbers stand here"],
  ["one column", "400;1\n401\n402;1", "2: One number stands here"],
  ["a place that comes twice", "400;1\n401;2\n401;3\n403;1\n404;2", "3: 401 stands here a second time"],
  ["an axis that turns round", "400;1\n401;2\n402;3\n401.5;1\n404;2", "4: 401.5 follows 402, against"],
  ["micrometres taken for nanometres", "0.4;1\n0.5;2\n0.6;3\n0.7;1\n0.8;2", "1: 0.4 nm is no light"],
  ["a letter", "Dear colleague,\nthe spectrum follows by post.", "file: No line of two numbers"],
  ["too few points", "400;1\n401;2", "at least 5 points"],
])("%s is refused, and the line is named", (_, text, reason) => {
  expect(refusal(text)).toContain(reason);
});

test("a table of more points than any bench spectrum has is refused", () => {
  const text = Array.from({ length: 100_001 }, (_, at) => `${300 + at / 100} ${at % 7}`).join("\n");
  expect(refusal(text)).toContain("100001: There are more than 100,000 points");
});

test("any table of numbers is read back as it was written", () => {
  const value = fc.integer({ min: -30_000, max: 30_000 }).map((whole) => whole / 10_000);
  fc.assert(
    fc.property(fc.array(value, { minLength: 5, maxLength: 200 }), fc.constantFrom(";", "\t", " ", ","), fc.boolean(), fc.boolean(), (values, separator, hasComma, isFalling) => {
      const mark = hasComma && separator !== "," ? "," : ".";
      const axis = values.map((_, at) => 300 + (isFalling ? values.length - at : at) * 0.25);
      const text = axis.map((x, at) => `${String(x).replace(".", mark)}${separator}${String(values[at]).replace(".", mark)}`).join("\n");
      const result = readSpectrumFile(text, { xUnit: "nm", yUnit: "absorbance" });
      expect(result.ok && { xs: result.spectrum.xs, ys: result.spectrum.ys }).toEqual({ xs: axis, ys: values });
    }),
    { numRuns: 400, seed: 3 },
  );
});
