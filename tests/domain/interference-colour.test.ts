import fc from "fast-check";
import { expect, test } from "vitest";
import { interferenceColour, interferenceGradient } from "#app/domain/interference-colour.ts";

const brightness = (retardationNm: number) => {
  const { red, green, blue } = interferenceColour(retardationNm);
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
};

test("no retardation, no light", () => {
  expect(interferenceColour(0)).toEqual({ red: 0, green: 0, blue: 0 });
});

// The order of colours on a quartz wedge, common knowledge of the trade: grey, white, yellow, red, violet, blue, green.
test("the first order runs from grey over white, yellow and red to the sensitive tint, then blue and green", () => {
  const grey = interferenceColour(100);
  expect(Math.max(grey.red, grey.green, grey.blue) - Math.min(grey.red, grey.green, grey.blue)).toBeLessThan(0.2);
  const white = interferenceColour(250);
  expect(Math.min(white.red, white.green, white.blue)).toBeGreaterThan(0.85);
  const yellow = interferenceColour(330);
  expect(yellow.blue).toBeLessThan(Math.min(yellow.red, yellow.green) - 0.1);
  const red = interferenceColour(500);
  expect(red.red).toBeGreaterThan(red.green + 0.2);
  const blue = interferenceColour(650);
  expect(blue.blue).toBeGreaterThan(blue.red + 0.5);
  const green = interferenceColour(750);
  expect(green.green).toBeGreaterThan(Math.max(green.red, 0.5));
});

test("the sensitive tint is the darkest colour after the first order, where green light is put out", () => {
  const retardations = Array.from({ length: 61 }, (_, step) => 450 + 5 * step);
  const darkest = retardations.reduce((found, each) => (brightness(each) < brightness(found) ? each : found));
  // 530–575 nm in the textbooks, by convention and lamp.
  expect(darkest).toBeGreaterThan(530);
  expect(darkest).toBeLessThan(590);
  const { red, green, blue } = interferenceColour(darkest);
  expect(green).toBeLessThan(Math.min(red, blue));
});

test("every retardation gives a colour that a screen can show", () => {
  fc.assert(
    fc.property(fc.double({ min: 0, max: 20_000, noNaN: true }), (retardationNm) => {
      for (const part of Object.values(interferenceColour(retardationNm))) {
        expect(part).toBeGreaterThanOrEqual(0);
        expect(part).toBeLessThanOrEqual(1);
      }
    }),
  );
});

test.each([-1, Number.NaN, Infinity])("%s is no retardation", (retardationNm) => {
  expect(() => interferenceColour(retardationNm)).toThrow(RangeError);
});

test("the gradient runs from black through so many stops", () => {
  const gradient = interferenceGradient({ stepNm: 100 });
  expect(gradient).toMatch(/^linear-gradient\(90deg,#000000,/);
  expect(gradient.match(/#[0-9a-f]{6}/g)).toHaveLength(19);
});
