import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { interferenceGradient } from "#app/domain/interference-colour.ts";

const css = readFileSync(new URL("../../app/app.css", import.meta.url), "utf8");

function tokensAfter(opening: string): Record<string, string> {
  const start = css.indexOf(opening);
  expect(start, `app.css has no ${opening}`).toBeGreaterThan(-1);
  const block = css.slice(start, css.indexOf("}", start));
  return Object.fromEntries([...block.matchAll(/--color-([a-z0-9-]+): (#[0-9a-f]{6});/g)].map((match) => [match[1], match[2]]));
}

/** Relative luminance and contrast ratio of WCAG 2.2. */
function luminance(hex: string): number {
  const [red, green, blue] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((part) => (part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4));
  return 0.2126 * red! + 0.7152 * green! + 0.0722 * blue!;
}
function contrast(one: string, other: string): number {
  const [dark, bright] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (bright! + 0.05) / (dark! + 0.05);
}

const rooms = {
  light: tokensAfter("@theme {"),
  dim: tokensAfter(':root[data-room="dim"] {'),
};
const texts = ["ink", "ink-2", "ink-3", "tint", "straw", "green", "red", "blue"];
const grounds = ["paper", "sheet", "sunken", "well", "track", "tint-bg", "straw-bg", "green-bg", "red-bg", "blue-bg"];

test.each(["light", "dim"] as const)("every text role is legible on every ground in the %s room", (room) => {
  const tokens = rooms[room];
  for (const text of texts) {
    for (const ground of grounds) {
      expect(contrast(tokens[text]!, tokens[ground]!), `${text} on ${ground}`).toBeGreaterThanOrEqual(4.5);
    }
  }
  for (const [text, ground] of [["on-tint", "tint"], ["on-tint", "tint-2"], ["on-red", "red"], ["on-red", "red-2"], ["on-ink", "ink"]] as const) {
    expect(contrast(tokens[text]!, tokens[ground]!), `${text} on ${ground}`).toBeGreaterThanOrEqual(4.5);
  }
});

test.each(["light", "dim"] as const)("an outline or a mark stands out from what is around it in the %s room", (room) => {
  for (const mark of ["edge", "straw-mark"]) {
    for (const ground of ["paper", "sheet", "well"]) expect(contrast(rooms[room][mark]!, rooms[room][ground]!), `${mark} on ${ground}`).toBeGreaterThanOrEqual(3);
  }
});

test("the dim room is the same whether chosen by hand or by the system", () => {
  expect(tokensAfter(":root:not([data-room]) {")).toEqual(rooms.dim);
  expect(Object.keys(rooms.dim).sort()).toEqual(Object.keys(rooms.light).sort());
});

test("the ornament shows the computed interference colours", () => {
  expect(css).toContain(`--ramp: ${interferenceGradient()};`);
});
