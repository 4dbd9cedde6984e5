import { expect, test } from "vitest";
import { indexTokens, queryTokens } from "#app/features/stones/search-tokens.ts";

const finds = (query: string, ...texts: string[]) => {
  const index = new Set(indexTokens(texts));
  const tokens = queryTokens(query);
  return tokens.length > 0 && tokens.every((token) => index.has(token));
};

test.each(["MQ-26-0417-1", "mq-26-0417", "MQ-26-0417 · 1", "mq26", "0417", "417", "26-0417"])("the code MQ-26-0417-1 is found by “%s”", (query) => {
  expect(finds(query, "MQ-26-0417-1")).toBe(true);
});

test.each(["purp", "OVAL", "red oval", "élan", "elan jew", "bluegreen", "green"])("words are found by “%s”, from their beginning, in any case and accent", (query) => {
  expect(finds(query, "Purplish red oval", "Élan Jewels", "Blue-green")).toBe(true);
});

test.each(["val", "xyz", "oval blue", "MQ-26-0418", "a", "%", "''"])("“%s” finds nothing", (query) => {
  expect(finds(query, "Purplish red oval", "MQ-26-0417-1")).toBe(false);
});

test("letters of every script are tokens, and every token fits its ASCII column", () => {
  expect(finds("红色", "红色椭圆")).toBe(true);
  expect(finds("агат", "Агаты")).toBe(true);
  for (const token of indexTokens(["红色椭圆形红色椭圆形红色", "Ωmega-Größe 💎 Þórr", "x".repeat(10_000)])) expect(token).toMatch(/^[\x21-\x7e]{2,40}$/);
});
