import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { AppError } from "#app/domain/app-error.ts";
import { requireGoodPassword } from "#app/features/accounts/require-good-password.server.ts";

const person = { name: "Perpetua Lindqvist", email: "perpetua.lindqvist@harbour.example", laboratoryName: "Sandreed Gem Testing" };

function verdictOn(password: string): string {
  try {
    requireGoodPassword({ ...person, password });
    return "accepted";
  } catch (error) {
    expect(error).toBeInstanceOf(AppError);
    expect((error as AppError).fieldErrors.password).toHaveLength(1);
    return (error as AppError).userMessage.startsWith("This password is among") ? "common" : "length";
  }
}

test.each([
  "passwordpassword",
  "Password12345678",
  "p4ssw0rdp4ssw0rd",
  "P@ssw0rd-P@ssw0rd-2026",
  "123456789012345",
  "987654321098765432",
  "aaaaaaaaaaaaaaa",
  "qwertyuiopasdfgh",
  "1qaz2wsx3edc4rfv",
  "abcabcabcabcabcabc",
  "iloveyouforever",
  "correct horse battery staple",
  "CorrectHorseBatteryStaple1",
  "the quick brown fox",
  "summer sunshine 2026",
  "monkey_dragon_1999",
  "isogyreisogyre2026",
  "gemmologylaboratory",
  "perpetualindqvist",
  "Perpetua Lindqvist 1984",
  "perpetua.lindqvist@harbour.example",
  "Sandreed Gem Testing 1",
  "lindqvist-perpetua-lindqvist",
])("“%s” is refused as common", (password) => {
  expect(verdictOn(password)).toBe("common");
});

test.each(["plinth otter cadmium", "vaguely-marzipan-tractor", "x7#kQ2m!vB9zLp4w", "Kartoffelkuchen unter Wasser", "ångström och fjärilar", "wet lamp soup thirty goats", "密码很长的一句话没有人会想到它吧对不对"])(
  "“%s” is accepted: no rule about kinds of characters",
  (password) => {
    expect(verdictOn(password)).toBe("accepted");
  },
);

test("fourteen characters are too few, fifteen do, 256 are kept whole and 257 are refused", () => {
  const signs = Array.from({ length: 260 }, (_, at) => String.fromCodePoint(0x4e00 + ((at * 7919) % 20_000))).join("");
  expect([14, 15, 256, 257].map((length) => verdictOn(signs.slice(0, length)))).toEqual(["length", "accepted", "accepted", "length"]);
});

test("the lists are lower case, sorted and without doubles", () => {
  for (const name of ["words.txt", "phrases.txt"]) {
    const lines = readFileSync(`fixtures/common-passwords/${name}`, "utf8").trimEnd().split("\n");
    expect(lines.length).toBeGreaterThan(100);
    expect(lines).toEqual([...new Set(lines)].sort());
    expect(lines.filter((line) => !/^[a-z0-9]{3,40}$/.test(line))).toEqual([]);
  }
});
