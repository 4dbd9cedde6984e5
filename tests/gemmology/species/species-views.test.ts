import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { colourFamiliesOf } from "#app/gemmology/species/colour-families.ts";
import { constantSources } from "#app/gemmology/species/constant-sources.ts";
import { readingOffset } from "#app/gemmology/species/reading-offset.ts";
import { speciesSpan } from "#app/gemmology/species/species-span.ts";
import { harmClassesOf, harmfulTests, testHarm } from "#app/gemmology/species/test-harm.ts";

const { rows, table } = loadSpeciesTable();
const row = (id: string) => rows.find((one) => one.id === id)!;

test("a compound colour belongs to the family of its noun, a double one to both", () => {
  expect(colourFamiliesOf(["purplish red"])).toEqual(["red"]);
  expect(colourFamiliesOf(["reddish brown"])).toEqual(["brown"]);
  expect(colourFamiliesOf(["Blue-green"])).toEqual(["blue", "green"]);
  expect(colourFamiliesOf(["any dye colour"])).toHaveLength(14);
});

test("every form has a colour that can be looked for", () => {
  const none = rows.filter(({ colours }) => colourFamiliesOf(colours).length === 0).map(({ id }) => id);
  expect(none).toEqual([]);
});

test("a source says which constants were compared with it; what none names is from memory", () => {
  const sources = constantSources(row("ruby"));
  expect(sources[0]!.citation).toMatch(/^G\. F\. Herbert Smith/);
  expect(sources[0]!.constants).toEqual(expect.arrayContaining(["index", "dispersion", "birefringence", "sg", "hardness"]));
  expect(constantSources({ sources: ["memory"] })).toEqual([]);
});

test("a species spans all its forms", () => {
  const { index, sg } = speciesSpan(table.nodes.find(({ id }) => id === "corundum")!.forms);
  expect(index).toEqual([1.757, 1.78]);
  expect(sg).toEqual([3.95, 4.1]);
});

test("an offset is nothing within the range, signed beyond it and counted in uncertainties", () => {
  expect(readingOffset({ value: 1.76, u: 0.002 }, [1.757, 1.779])).toEqual({ gap: 0, inU: 0 });
  expect(readingOffset({ value: 1.75, u: 0.002 }, [1.757, 1.779]).inU).toBeCloseTo(3.5, 9);
  expect(readingOffset({ value: 4.2, u: 0.05 }, [3.95, 4.05]).gap).toBeCloseTo(-0.15, 9);
});

// What care guides agree on; common practice.
test.each([
  ["opal-hydrophane", "contactLiquid", 10],
  ["pearl-natural-saltwater", "acid", 10],
  ["amber", "solvent", 10],
  ["emerald", "ultrasonic", 10],
  ["opal-doublet", "water", 10],
  ["topaz-f", "ultrasonic", 10],
  ["spodumene-kunzite", "ultraviolet", 1],
  ["ruby-lead-glass-filled", "acid", 10],
  ["turquoise", "immersion", 10],
  ["spinel-red", "contactLiquid", 0.1],
  ["diamond", "contactLiquid", 0],
  ["garnet-almandine", "water", 0],
] as const)("what a test can do to %s: %s", (id, test, harm) => {
  expect(testHarm(row(id))[test]).toBe(harm);
});

test("every form falls under a kind, and none may be scratched, streaked or touched with a hot point", () => {
  for (const one of rows) {
    expect(harmClassesOf(one).length, one.id).toBeGreaterThan(0);
    const harm = testHarm(one);
    expect(harm.hardness, one.id).toBe(10);
    for (const name of harmfulTests) expect([0, 0.1, 1, 10], `${one.id} ${name}`).toContain(harm[name]);
  }
});

test("whatever is porous takes no liquid at all", () => {
  for (const one of rows.filter(({ cautions }) => /porous: no liquids/.test(cautions.join()))) expect(testHarm(one).contactLiquid, one.id).toBe(10);
});
