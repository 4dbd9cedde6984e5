import { expect, test } from "vitest";
import { formatWithUncertainty } from "#app/domain/format-uncertainty.ts";

// The form of JCGM 100:2008, 7.2.2, second example line: the number in brackets is the uncertainty in the last digit.
test.each([
  [1.762, 0.0015, "1.762(2)"],
  [1.77, 0.001, "1.770(1)"],
  [0.008, 0.0012, "0.008(1)"],
  [3.997, 0.021, "4.00(2)"],
  [3.994, 0.0127, "3.99(1)"],
  [3.994, 0.0095, "3.99(1)"],
  [1.5443, 0.0007, "1.5443(7)"],
  [2.66, 0.115, "2.7(1)"],
  [2.143, null, "2.143"],
  [4, 0, "4"],
  [153, 24, "153(20)"],
])("%s with an uncertainty of %s is written %s", (value, u, text) => {
  expect(formatWithUncertainty(value, u)).toBe(text);
});

test("an uncertainty smaller than the last digit that may be written is left out", () => {
  expect(formatWithUncertainty(3.9941, 0.0002, { mostDecimals: 3 })).toBe("3.994");
});

test.each([Number.NaN, Number.POSITIVE_INFINITY])("%s is refused", (value) => {
  expect(() => formatWithUncertainty(value, 0.1)).toThrow(RangeError);
});
