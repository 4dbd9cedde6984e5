import fc from "fast-check";
import { expect, test } from "vitest";
import { addMoney } from "#app/domain/money/add-money.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { money } from "#app/domain/money/money.ts";
import { parseAmount } from "#app/domain/money/parse-amount.ts";
import { taxOf } from "#app/domain/money/tax-of.ts";

test.each([
  [123456789, "EUR", "1\u202f234\u202f567.89 EUR"],
  [5, "EUR", "0.05 EUR"],
  [-13800, "EUR", "−138.00 EUR"],
  [1500, "JPY", "1\u202f500 JPY"],
  [1234567, "KWD", "1\u202f234.567 KWD"],
] as const)("%s minor units of %s are written %s", (amountMinor, currency, text) => {
  expect(formatMoney({ amountMinor, currency })).toBe(text);
});

test.each([
  ["1234.5", "EUR", 123450],
  ["1 234,50", "EUR", 123450],
  ["6500", "EUR", 650000],
  ["100", "JPY", 100],
  ["100.5", "JPY", undefined],
  ["1.234", "EUR", undefined],
  ["-5", "EUR", undefined],
  ["1e3", "EUR", undefined],
  ["", "EUR", undefined],
  ["99999999999999999999", "EUR", undefined],
] as const)("“%s” in %s is read as %s", (text, currency, expected) => {
  expect(parseAmount(text, currency)).toBe(expected);
});

test("tax is rounded half to even, once", () => {
  expect(taxOf(money(250, "EUR"), 0.01).amountMinor).toBe(2);
  expect(taxOf(money(350, "EUR"), 0.01).amountMinor).toBe(4);
  expect(taxOf(money(11500, "EUR"), 0.2).amountMinor).toBe(2300);
});

test("tax is never further than half a minor unit from the exact product", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 10 ** 9 }), fc.integer({ min: 0, max: 10_000 }), (amountMinor, shareE4) => {
      const tax = taxOf(money(amountMinor, "EUR"), shareE4 / 10_000).amountMinor;
      expect(Math.abs(tax * 10_000 - amountMinor * shareE4)).toBeLessThanOrEqual(5_000);
    }),
  );
});

test("euros and dollars do not add up", () => {
  expect(() => addMoney(money(1, "EUR"), money(1, "USD"))).toThrow(RangeError);
});
