import fc from "fast-check";
import { expect, test } from "vitest";
import { formatRegisterCode, parseRegisterCode, registerCodeFrom } from "#app/domain/register-code.ts";

const randomValues = fc.array(fc.integer({ min: 0, max: 31 }), { minLength: 15, maxLength: 15 });

test("a code is read back however it is typed", () => {
  fc.assert(
    fc.property(randomValues, (values) => {
      const code = registerCodeFrom(values);
      expect(parseRegisterCode(code.toLowerCase())).toBe(code);
      expect(parseRegisterCode(` ${formatRegisterCode(code)} `)).toBe(code);
      expect(parseRegisterCode(code.replaceAll("0", "o").replaceAll("1", "l"))).toBe(code);
    }),
  );
});

test("any one wrong character is noticed", () => {
  fc.assert(
    fc.property(randomValues, fc.integer({ min: 0, max: 15 }), fc.integer({ min: 1, max: 31 }), (values, at, shift) => {
      const alphabet = "0123456789ABCDEFGHJKMNPQRSTVWXYZ";
      const code = registerCodeFrom(values);
      const wrong = alphabet[(alphabet.indexOf(code[at]!) + shift) % 32]!;
      expect(parseRegisterCode(code.slice(0, at) + wrong + code.slice(at + 1))).toBeUndefined();
    }),
  );
});

test("any two characters that change places are noticed", () => {
  fc.assert(
    fc.property(randomValues, fc.integer({ min: 0, max: 15 }), fc.integer({ min: 0, max: 15 }), (values, i, j) => {
      const code = registerCodeFrom(values);
      fc.pre(code[i] !== code[j]);
      const swapped = [...code];
      [swapped[i], swapped[j]] = [swapped[j]!, swapped[i]!];
      expect(parseRegisterCode(swapped.join(""))).toBeUndefined();
    }),
  );
});

test.each(["", "7KQ4", "7KQ4-M2XD-9TPA-3HZ", "ÄÄÄÄ-M2XD-9TPA-3HZW", "U".repeat(16), "<script>alert(1)</script>", "0".repeat(10_000)])("“%s” is no code", (text) => {
  expect(parseRegisterCode(text)).toBeUndefined();
});
