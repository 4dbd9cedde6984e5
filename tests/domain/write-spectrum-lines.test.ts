import fc from "fast-check";
import { expect, test } from "vitest";
import { spectralColour } from "#app/domain/spectral-colour.ts";
import { spectrumLineWords } from "#app/domain/bench-tests/spectrum-line-words.ts";
import { readSpectrumLines, type SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { writeSpectrumLines } from "#app/domain/bench-tests/write-spectrum-lines.ts";

const aLine: fc.Arbitrary<SpectrumLine> = fc
  .record({ tenths: fc.integer({ min: 4100, max: 7500 }), half: fc.integer({ min: 1, max: 40 }), kind: fc.constantFrom("line" as const, "band" as const), strength: fc.constantFrom("strong" as const, "medium" as const, "weak" as const, "faint" as const, null), isEmission: fc.boolean() })
  .map(({ tenths, half, kind, strength, isEmission }) => ({ nm: tenths / 10, halfWidthNm: kind === "line" ? 0 : half / 2, kind, strength, isEmission }));

test("lines that are drawn are the same when their words are read again", () => {
  fc.assert(
    fc.property(fc.array(aLine, { maxLength: 12 }), (lines) => {
      const { lines: read, problem } = readSpectrumLines(writeSpectrumLines(lines));
      expect(problem).toBeNull();
      expect(read).toHaveLength(lines.length);
      const sorted = lines.toSorted((a, b) => a.nm - b.nm);
      read.forEach((line, at) => {
        // Ends are written to a tenth of a nanometre.
        expect(Math.abs(line.nm - sorted[at]!.nm)).toBeLessThanOrEqual(0.051);
        expect(Math.abs(line.halfWidthNm - sorted[at]!.halfWidthNm)).toBeLessThanOrEqual(0.051);
      });
    }),
    { numRuns: 300, seed: 9 },
  );
});

test("a line is told in words", () => {
  const [line, band] = readSpectrumLines("694 e strong, 540-580 weak").lines.toReversed();
  expect(spectrumLineWords(line!)).toBe("line at 694 nm, strong, shining");
  expect(spectrumLineWords(band!)).toBe("band from 540 to 580 nm, weak");
});

test("the colours of the spectrum are red, green, blue and violet where they are", () => {
  const strongest = (nm: number) => {
    const { red, green, blue } = spectralColour(nm);
    return red > green && red > blue ? "red" : green > blue ? "green" : "blue";
  };
  expect([680, 530, 460].map(strongest)).toEqual(["red", "green", "blue"]);
  const yellow = spectralColour(580);
  expect(Math.min(yellow.red, yellow.green)).toBeGreaterThan(2 * yellow.blue);
  for (let nm = 380; nm <= 780; nm += 5) for (const part of Object.values(spectralColour(nm))) expect(part >= 0 && part <= 1).toBe(true);
});
