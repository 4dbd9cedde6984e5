import { expect, test } from "vitest";
import { findConclusionWords, neutralWordsMessage } from "#app/features/take-ins/neutral-words.ts";

test("a species and a metal are refused, with words that say what to write", () => {
  expect(neutralWordsMessage("ruby ring, gold")).toBe(
    "Describe what is seen: “ruby” and “gold” are conclusions. For example: red oval in a yellow metal ring.",
  );
});

test.each([
  "Golden yellow oval, transparent",
  "Purplish red oval in a yellow metal ring",
  "Greenish blue octagon, set",
  "Black bead strand, 61",
  "Opalescent white cabochon",
  "Pearly lustre, silky bands, rose cut",
  "Crystal with a polished face, 12.5 × 8 mm",
  "Strand of 585 beads",
  "Amberish? no: brownish orange round",
  "Silvery grey octagon, glassy lustre",
  "Two white stones of 2.14 ct",
])("“%s” is neutral", (text) => {
  expect(findConclusionWords(text)).toEqual([]);
});

test.each([
  ["RUBY", ["RUBY"]],
  ["two rubies", ["rubies"]],
  ["Smaragd? emeralds", ["emeralds"]],
  ["émerald", ["émerald"]],
  ["lapis lazuli bead", ["lapis lazuli"]],
  ["tiger’s eye cabochon", ["tiger’s eye"]],
  ["white stone, 18k", ["18k"]],
  ["ring stamped 750", ["750"]],
  ["9 ct ring", ["9 ct"]],
  ["worth €5,000", ["worth", "€5,000"]],
  ["5000 EUR ring", ["5000 eur"]],
  ["Burmese red stone", ["Burmese"]],
  ["natural stone", ["natural"]],
  ["lab-grown stone", ["lab-grown"]],
  ["ruby, Ruby, RUBY", ["RUBY"]],
  ["rock crystal egg", ["rock crystal"]],
  ["cubic zirconia", ["cubic zirconia"]],
])("“%s” says what it is", (text, words) => {
  expect(findConclusionWords(text)).toEqual(words);
});

test("a cut that is called after a stone gets the word for its outline", () => {
  expect(neutralWordsMessage("emerald cut, green")).toBe("Describe what is seen: “emerald” is a conclusion. For the shape write “octagon”.");
  expect(neutralWordsMessage("diamond-shaped plaque")).toContain("For the shape write “kite”.");
});

test("a colour that is called after a stone gets the colour's own name", () => {
  expect(neutralWordsMessage("turquoise cabochon")).toContain("For example: greenish blue oval");
});

test("a long text of many names stays one readable sentence", () => {
  const message = neutralWordsMessage("ruby sapphire emerald topaz garnet opal ".repeat(300))!;
  expect(message.length).toBeLessThan(200);
});
