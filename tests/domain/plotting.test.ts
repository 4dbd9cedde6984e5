import fc from "fast-check";
import { expect, test } from "vitest";
import { cutOutline, cutOutlineNames, cutOutlines, outlineNamed } from "#app/domain/cut-outline/cut-outline.ts";
import { edgeAt } from "#app/domain/cut-outline/polygon.ts";
import { inclusionName, inclusionTypeNames, plotSides } from "#app/domain/inclusion.ts";
import { clockWords, pictureWords } from "#app/domain/place-words.ts";
import { scaleBar } from "#app/domain/scale-bar.ts";

test.each([
  [4.2, "1 mm", 1 / 4.2],
  [1, "200 µm", 0.2],
  [0.35, "50 µm", 0.05 / 0.35],
  [20, "5 mm", 0.25],
  [0.01, "2 µm", 0.2],
])("a picture %s mm wide gets a bar of %s", (widthMm, text, share) => {
  expect(scaleBar(widthMm).text).toBe(text);
  expect(scaleBar(widthMm).share).toBeCloseTo(share, 9);
});

test("a bar is a round length of a tenth to 28 % of its picture, whatever it shows", () => {
  fc.assert(
    fc.property(fc.double({ min: 0.01, max: 500, noNaN: true }), (widthMm) => {
      const { text, share } = scaleBar(widthMm);
      expect(share).toBeGreaterThan(0.1);
      expect(share).toBeLessThanOrEqual(0.2801);
      const [value, unit] = text.split(" ") as [string, string];
      expect(Number(value) / (unit === "mm" ? 1 : 1000)).toBeCloseTo(share * widthMm, 9);
      expect(value.replace(/[0.]/g, "")).toMatch(/^[125]$/);
    }),
    { numRuns: 500, seed: 8 },
  );
  for (const widthMm of [0, -1, Number.NaN, Infinity]) expect(() => scaleBar(widthMm)).toThrow(RangeError);
});

test.each([
  [{ x: 0.5, y: 0.02 }, "at 12 o'clock, at the girdle"],
  [{ x: 0.98, y: 0.5 }, "at 3 o'clock, at the girdle"],
  [{ x: 0.5, y: 0.85 }, "at 6 o'clock, half way out"],
  [{ x: 0.3, y: 0.5 }, "at 9 o'clock, inside"],
  [{ x: 0.52, y: 0.49 }, "in the centre"],
  [{ x: 0.75, y: 0.067 }, "at 1 o'clock, at the girdle"],
])("%o on the outline lies %s", (place, words) => {
  expect(clockWords(place)).toBe(words);
});

test("a place on a photograph is told by its part of the picture", () => {
  expect([{ x: 0.1, y: 0.1 }, { x: 0.5, y: 0.5 }, { x: 0.9, y: 0.5 }, { x: 0.5, y: 0.9 }].map(pictureWords)).toEqual(["upper left", "middle", "middle right", "lower middle"]);
});

test.each(cutOutlines)("the outline %s fills its frame, and no facet leaves it", (code) => {
  for (const side of plotSides) {
    const { outline, lines, aspect } = cutOutline(code, side);
    expect(aspect).toBeGreaterThan(0.4);
    for (const axis of [0, 1] as const) {
      const values = outline.map((point) => point[axis]);
      expect(Math.max(...values)).toBeCloseTo(1, 2);
      expect(Math.min(...values)).toBeCloseTo(-1, 2);
    }
    for (const [right, down] of lines.flat()) {
      const edge = edgeAt(outline, Math.atan2(right, -down));
      expect(Math.hypot(right, down)).toBeLessThanOrEqual(Math.hypot(...edge) + 0.02);
    }
  }
});

test("the outline is taken from what the desk wrote, where it names one", () => {
  expect(["Purplish red oval, transparent", "Green octagon in a yellow metal ring", "Round cabochon", "Yellow-green cabochon", "Tapered baguette", "Violet pear", "Grey lump"].map(outlineNamed)).toEqual(["oval", "octagon", "cabochonRound", "cabochonOval", "rectangle", "pear", undefined]);
  expect(Object.keys(cutOutlineNames)).toEqual([...cutOutlines]);
});

test("what no word fits is called as it was written", () => {
  expect(inclusionName({ type: "other", otherText: "a small fly" })).toBe("a small fly");
  expect(inclusionName({ type: "bubble", otherText: "" })).toBe(inclusionTypeNames.bubble);
});
