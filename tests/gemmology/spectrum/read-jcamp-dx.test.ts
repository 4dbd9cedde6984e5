import fc from "fast-check";
import { expect, test } from "vitest";
import { SpectrumFileError, type AssumedUnits, type MeasuredSpectrum } from "#app/gemmology/spectrum/measured-spectrum.ts";
import { ordinateLines } from "#app/gemmology/spectrum/ordinate-lines.ts";
import { readSpectrumFile } from "#app/gemmology/spectrum/read-spectrum-file.ts";
import { mostSpectrumPoints } from "#app/gemmology/spectrum/spectrum-limits.ts";
import { jcampDxOf, ordinateForms } from "./write-jcamp-dx.ts";

const assumed: AssumedUnits = { xUnit: "nm", yUnit: "absorbance" };
const ordinatesOf = (...texts: string[]) => ordinateLines(texts.map((text, at) => ({ line: at + 1, text }))).ordinates;
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

// McDonald and Wilks, Applied Spectroscopy 42 (1988) 151–162, table VIIb: one row of ordinates in every form.
test.each([
  ["FIX", "1 2 3 3 2 1 0 -1 -2 -3"],
  ["PAC", "1+2+3+3+2+1+0-1-2-3"],
  ["PAC with blanks", "1 2 3 3 2 1 0-1-2-3"],
  ["SQZ", "1BCCBA@abc"],
  ["DIF", "1JJ%jjjjjj"],
  ["DIFDUP", "1JT%jX"],
])("the published row of ordinates is read in the form %s", (_, row) => {
  expect(ordinatesOf(`0 ${row}`)).toEqual([1, 2, 3, 3, 2, 1, 0, -1, -2, -3]);
});

// The same paper's table VI, its DIFDUP line as corrected in Baumbach et al., Pure and Applied Chemistry 73 (2001) 1765.
const published = {
  fix: ["599.860 0 0 0 0 2 4 4 4 7 5 4 4 5 5 7 10 11 11 6 5 7 6 9 9 7", "648.081 10 10 9 10 11 12 15 16 16 14 17 38 38 35 38 42 47 54", "682.799 59 66 75 78 88 96 104 110 121 128"],
  difDup: ["599.860@VKT%TLkj%J%KLJ%njKjL%kL%jJULJ%kLK1%lLMNPNPRLJ0QTOJ1P", "700.158A28"],
};
test("the published spectrum of 53 points is the same in free format and in DIFDUP, and its check holds", () => {
  const fix = ordinatesOf(...published.fix);
  expect(fix).toHaveLength(53);
  const difDup = ordinateLines(published.difDup.map((text, at) => ({ line: at + 1, text })));
  expect(difDup.ordinates).toEqual(fix);
  expect(difDup.isChecked).toBe(true);
  const file = (lines: readonly string[]) => ["##TITLE=x", "##XUNITS=1/CM", "##YUNITS=ABSORBANCE", "##XFACTOR=1.0", "##YFACTOR=1.0", "##FIRSTX=599.860", "##LASTX=700.158", "##NPOINTS=53", "##XYDATA=(X++(Y..Y))", ...lines, "##END="].join("\n");
  const [free, packed] = [read(file(published.fix)), read(file(published.difDup))];
  expect(packed.xs).toEqual(free.xs);
  // The abscissa that the paper prints before ordinate 26 and 44.
  expect(free.xs[25]).toBeCloseTo(648.081, 2);
  expect(free.xs[43]).toBeCloseTo(682.799, 2);
});

test("a digit that was lost is found by the check of the next line, and the line is named", () => {
  expect(() => ordinatesOf("599.860@VKT%TLkj%J%KLJ%njKjL%kL%jJULJ%kLK1%lLMNPNPRLJ0QTOJ1O", "700.158A28")).toThrow("repeating the last ordinate before it, 127, but says 128");
});

test("E is an exponent with a sign behind it and the squeezed 5 without", () => {
  expect(ordinatesOf("1 1.5E+02 -2.0E-01")).toEqual([150, -0.2]);
  expect(ordinatesOf("1 E3e")).toEqual([53, -5]);
});

const anOrdinate = fc.oneof(fc.integer({ min: -5, max: 5 }), fc.integer({ min: -99_999, max: 99_999 }));
/** Stretches that stay the same or climb evenly, which the compressed forms are for. */
const someOrdinates = fc
  .array(fc.record({ start: anOrdinate, step: fc.integer({ min: -12, max: 12 }), length: fc.integer({ min: 1, max: 40 }) }), { minLength: 1, maxLength: 20 })
  .map((stretches) => stretches.flatMap(({ start, step, length }) => Array.from({ length }, (_, at) => start + at * step)))
  .filter((ordinates) => ordinates.length >= 5);

test.each(ordinateForms)("what is written in %s is read back exactly", (form) => {
  fc.assert(
    fc.property(someOrdinates, fc.integer({ min: 300, max: 900 }), fc.constantFrom(1, 2, 5), fc.boolean(), (ordinates, firstX, step, isFalling) => {
      const written = isFalling ? { firstX: firstX + ordinates.length * step, step: -step } : { firstX, step };
      const { xs, ys } = read(jcampDxOf({ ordinates, form, ...written }));
      expect(ys).toEqual(ordinates);
      expect(xs).toEqual(ordinates.map((_, at) => written.firstX + at * written.step));
    }),
    { numRuns: 200, seed: 4 },
  );
});

test("factors, units and a title are taken from the records, whatever the spelling of their labels", () => {
  const { title, xUnit, yUnit, xs, ys, isUnitAssumed } = read(jcampDxOf({ ordinates: [4, 5, 9, 5, 4, 3], form: "DIFDUP", firstX: 25_000, step: -500, xUnits: "1/CM", yUnits: "TRANSMITTANCE", xFactor: 0.5, yFactor: 0.1 }).replace("##XFACTOR", "## x_fac-tor"));
  expect({ title, xUnit, yUnit, isUnitAssumed }).toEqual({ title: "An invented spectrum", xUnit: "1/cm", yUnit: "transmittance", isUnitAssumed: false });
  expect(xs).toEqual([12_500, 12_250, 12_000, 11_750, 11_500, 11_250]);
  ys.forEach((y, at) => expect(y).toBeCloseTo([0.4, 0.5, 0.9, 0.5, 0.4, 0.3][at]!, 12));
});

test("comments are no data, and a transmittance up to 95 is per cent", () => {
  const text = jcampDxOf({ ordinates: [90, 95, 91, 90, 88, 85], form: "AFFN", firstX: 400, step: 1, yUnits: "TRANSMITTANCE", more: ["$$ 1 2 3", "##RESOLUTION=2 $$ nm"] });
  const { ys, notes } = read(text);
  expect(ys[1]).toBeCloseTo(0.95, 12);
  expect(notes.join()).toContain("per cent");
});

test("pairs of x and y are read, apart by commas, blanks, semicolons and lines", () => {
  const { xs, ys, kind } = read("##TITLE=x\n##XUNITS=NANOMETERS\n##YUNITS=ABSORBANCE\n##NPOINTS=5\n##XYPOINTS=(XY..XY)\n400, 0.1; 410.5,0.2\n420 0.3 430,.25;\n441, 1E-01\n##END=");
  expect(xs).toEqual([400, 410.5, 420, 430, 441]);
  expect(ys).toEqual([0.1, 0.2, 0.3, 0.25, 0.1]);
  expect(kind).toBe("curve");
});

test("a table of peaks is read as what it is, in the order of its wavelengths", () => {
  const { xs, ys, kind } = read("##TITLE=x\n##XUNITS=NANOMETERS\n##YUNITS=ABSORBANCE\n##PEAK TABLE=(XYW..XYW)\n694,3,1\n476,2,1 468,1,1\n##END=");
  expect({ xs, ys, kind }).toEqual({ xs: [468, 476, 694], ys: [1, 2, 3], kind: "peakTable" });
});

test("a block of several is read where one of them alone is a spectrum", () => {
  const inner = jcampDxOf({ ordinates: [1, 2, 3, 2, 1], form: "SQZ", firstX: 500, step: 10 });
  const linked = (...blocks: string[]) => ["##TITLE=Link", "##JCAMP-DX=4.24", "##DATA TYPE=LINK", `##BLOCKS=${blocks.length}`, ...blocks, "##END="].join("\n");
  expect(read(linked("##TITLE=Structure\n##ATOMLIST=\n1 C\n##END=", inner)).title).toBe("An invented spectrum");
  expect(refusal(linked(inner, inner))).toContain("2 spectra");
});

test("a value that was not measured is left out and said", () => {
  const { xs, notes } = read("##TITLE=x\n##XUNITS=NANOMETERS\n##YUNITS=ABSORBANCE\n##FIRSTX=400\n##LASTX=406\n##NPOINTS=7\n##XYDATA=(X++(Y..Y))\n400 1 2 ? 4 5 ?\n406 7\n##END=");
  expect(xs).toEqual([400, 401, 403, 404, 406]);
  expect(notes.join()).toContain("2 points were not measured");
});

const good = jcampDxOf({ ordinates: [10, 20, 35, 20, 10, 5, 5, 5], form: "AFFN", firstX: 400, step: 10 });
const damaged = (from: string | RegExp, to: string) => {
  const text = good.replace(from, to);
  expect(text).not.toBe(good);
  return text;
};
test.each([
  ["a file cut in its middle", good.slice(0, good.indexOf("20 10")), "announces 8 points"],
  ["fewer points than announced", damaged(" 5 5 5", " 5 5"), "announces 8 points (NPOINTS) and holds 7"],
  ["more points than announced", damaged(" 5 5 5", " 5 5 5 5"), "holds 9"],
  ["a word among the numbers", damaged(" 35 ", " NaN "), "15: “NaN” stands here, where an ordinate is needed."],
  ["infinity", damaged(" 35 ", " 1E+999 "), "is no ordinate"],
  ["an endless number", damaged(" 35 ", ` ${"9".repeat(400)} `), "is no ordinate"],
  ["a squeezed number without end", damaged(" 35 ", ` A${"9".repeat(400)} `), "larger than any ordinate"],
  ["an axis in hertz", damaged("NANOMETERS", "HZ"), "6: The axis counts “HZ”"],
  ["a decimal comma in a record", damaged("##FIRSTX=400", "##FIRSTX=400,5"), "10: FIRSTX is a number with a decimal point"],
  ["a factor of nothing", damaged("##YFACTOR=1", "##YFACTOR=0"), "factor of 0"],
  ["a table in a form of its own", damaged("(X++(Y..Y))", "(X++(R..R))"), "14: The data table has the form “(X++(R..R))”"],
  ["a label without its sign", damaged("##OWNER=Nobody", "##OWNER Nobody"), "5: A label begins with ##"],
  ["no data at all", damaged(/##XYDATA[\s\S]*5 5 5\r\n/, ""), "holds no spectrum"],
  ["arrays of several variables", damaged("##OWNER=Nobody", "##NTUPLES=NMR FID"), "5: This file holds arrays"],
  ["an axis that does not fit its lines", damaged("##LASTX=470", "##LASTX=4700").replace("5 5 5", "5 5\n470 5"), "16: This line begins at 470"],
  ["no end, no count", damaged(/##NPOINTS=8\r\n/, "").replace("##END=", ""), "stops without its end"],
  ["an axis of no light", damaged(/400/g, "-400"), "no light that a bench instrument reads"],
  ["too few points", jcampDxOf({ ordinates: [1, 2, 3, 2], form: "AFFN", firstX: 400, step: 10 }), "at least 5 points"],
])("%s is refused with its reason", (_, text, reason) => {
  expect(refusal(text)).toContain(reason);
});

test.each([
  ["a count that would fill the memory", "400A Z999999999", `more than ${mostSpectrumPoints.toLocaleString("en")} points`],
  ["counts on counts", "400A TT", "without the value that it repeats"],
  ["a difference with nothing before it", "400J", "without a value before it"],
  ["a count with nothing before it", "400S", "without the value that it repeats"],
  ["an abscissa alone", "400", "no ordinate"],
  ["a line that begins with a letter", "A400", "begins with its abscissa"],
])("%s is refused", (_, line, reason) => {
  expect(() => ordinatesOf(line)).toThrow(reason);
});

test("what is no text, empty, too long or without end is refused at once", () => {
  const started = performance.now();
  expect(refusal("")).toContain("empty");
  expect(refusal(" \r\n\t")).toContain("empty");
  expect(refusal("PK\u0003\u0004\u0000\u0000")).toContain("no text file");
  expect(refusal("9".repeat(4_000_001))).toContain("4 million characters");
  expect(refusal(`##TITLE=x\n##XYDATA=(X++(Y..Y))\n${"9 ".repeat(20_000)}`)).toContain("3: This line has more than 20,000");
  expect(refusal(`##TITLE=x\n##XYDATA=(X++(Y..Y))\n${"400A Z9999\n".repeat(100)}`)).toMatch(/points|repeating/);
  expect(performance.now() - started).toBeLessThan(2_000);
});

test("no text makes the reader throw, hang or answer with anything but a spectrum or a sentence", () => {
  const piece = fc.oneof(
    fc.constantFrom("##TITLE=", "##XYDATA=(X++(Y..Y))\n", "##XYPOINTS=(XY..XY)\n", "##PEAK TABLE=(XY..XY)\n", "##NPOINTS=", "##FIRSTX=400\n", "##LASTX=500\n", "##DELTAX=1\n", "##END=", "##", "$$", "\n", "400", " ", ",", ";", "\t", "?", "%", "@", "A", "j", "T", "s9", "E+99", "1E", "+-", ".", "NaN", "Infinity", "__proto__", "\uFEFF", "−5", "1,5", "500;0,25\n", "500,0.25\n"),
    fc.string({ maxLength: 12 }),
    fc.double().map(String),
  );
  fc.assert(
    fc.property(fc.array(piece, { maxLength: 60 }), (pieces) => {
      const result = readSpectrumFile(pieces.join(""), assumed);
      if (!result.ok) {
        expect(result.problem.message).toMatch(/[.?]$/);
        return;
      }
      const { xs, ys } = result.spectrum;
      expect(xs.length).toBe(ys.length);
      for (const value of [...xs, ...ys]) expect(Number.isFinite(value)).toBe(true);
    }),
    { numRuns: 3_000, seed: 7 },
  );
});

test("whatever character of a packed line is changed, the check refuses it or its last ordinate is still the right one", () => {
  const [line, check] = published.difDup as [string, string];
  let refused = 0;
  for (let at = line.indexOf("@") + 1; at < line.length; at++) {
    for (const other of "JKLMjklm%TUV") {
      if (line[at] === other) continue;
      try {
        expect(ordinatesOf(line.slice(0, at) + other + line.slice(at + 1), check).at(-1)).toBe(128);
      } catch (error) {
        if (!(error instanceof SpectrumFileError)) throw error;
        refused++;
      }
    }
  }
  expect(refused).toBeGreaterThan(400);
});
