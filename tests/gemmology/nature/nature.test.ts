import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { features } from "#app/gemmology/nature/feature.ts";
import { natureEvidence } from "#app/gemmology/nature/nature-evidence.ts";
import { beyondBench, referralReasons } from "#app/gemmology/nature/referral.ts";

const of = (speciesId: string | null, ...texts: string[]) => natureEvidence({ speciesId, texts });
const said = (speciesId: string | null, text: string) => of(speciesId, text).findings.map(({ question, answer, strength }) => `${question}: ${answer}, ${strength}`);

// Source: common practice, workflow §1.7: what a bench may report as a positive finding.
test.each([
  ["corundum", "Curved striae under 40×", "nature: synthetic, positive"],
  ["corundum", "gas bubbles in a row", "nature: synthetic, indication"],
  ["glass", "Bubbles, swirls", "nature: artificial, positive"],
  ["beryl", "chevron growth near the girdle", "nature: synthetic, positive"],
  ["beryl", "a seed plate parallel to the table", "nature: synthetic, positive"],
  ["corundum", "blue flashes in two fissures", "treatment: fissures filled with glass or resin, positive"],
  ["corundum", "partly dissolved silk", "treatment: heating at high temperature, indication"],
  ["chalcedony", "dye in fissures", "treatment: dyeing, positive"],
  ["corundum", "colour along the facet edges in immersion", "treatment: surface diffusion, positive"],
  [null, "a red ring under the girdle, a join at mid-height", "nature: composite, positive"],
  ["garnet-andradite", "horsetail fibres", "nature: natural, indication"],
] as const)("%s with “%s” is %s", (speciesId, text, expected) => {
  expect(said(speciesId, text)).toContain(expected);
});

test.each([
  ["corundum", "no curved striae, bubbles", []],
  ["corundum", "Without curved striae or gas bubbles.", []],
  ["corundum", "bubbles: none; curved striae not seen", []],
  ["corundum", "no striae; curved striae in the pavilion", ["nature: synthetic, positive"]],
  ["corundum", "no bubbles, but curved striae", ["nature: synthetic, positive"]],
  ["corundum", "No silk. Curved striae.", ["nature: synthetic, positive"]],
  ["corundum", "no curved striae through the table: curved striae through the girdle", ["nature: synthetic, positive"]],
  ["glass", "no crystals within 0.5 mm of the bubbles", []],
] as const)("“%s, %s”: a clause that denies one thing denies the rest of it, and no more", (speciesId, text, expected) => {
  expect(said(speciesId, text)).toEqual(expected);
});

test.each([
  ["opal", "blue and green colour flashes"],
  ["opal", "broad flashes of red over a dark body"],
  ["pearl", "seed pearls, strung"],
  ["beryl", "seed-pearl surround"],
  ["corundum", "two-phase inclusions with a gas bubble"],
  ["spinel", "a liquid with a moving bubble"],
  ["quartz", "needles join at 60°"],
  ["quartz", "a seam of calcite"],
] as const)("in %s, “%s” is evidence of nothing", (speciesId, text) => {
  expect(said(speciesId, text)).toEqual([]);
});

test("each feature is known by its own name, as it is ticked", () => {
  for (const { name, meanings, saysNothingOf } of features) {
    const speciesId = meanings.flatMap(({ species }) => (species === "any" ? [] : species))[0] ?? "corundum";
    const { findings, silent } = of(speciesId, name);
    if (meanings.length > 0) expect(findings.map(({ feature }) => feature), name).toContain(name);
    if (saysNothingOf) expect(silent.map(({ feature }) => feature), name).toContain(name);
  }
  expect(said("corundum", "Join of an assembled stone")).toEqual(["nature: composite, positive"]);
  expect(said("corundum", "no silk, intact")).toEqual([]);
});

test("bubbles speak of a melt by themselves, of a filling within a fissure", () => {
  expect(said("corundum", "two-phase inclusions, gas bubbles in a row")).toEqual(["nature: synthetic, indication"]);
  expect(said("corundum", "flattened bubbles in a fissure")).toEqual(["treatment: fissures filled with glass or resin, indication"]);
  expect(said("corundum", "an orange flash along a fracture")).toEqual(["treatment: fissures filled with glass or resin, positive"]);
  expect(said("beryl", "Flash effect")).toEqual(["treatment: fissures filled with glass or resin, positive"]);
  expect(said("beryl", "seeds at the girdle")).toEqual(["nature: synthetic, positive"]);
  expect(said(null, "Seam at the girdle, bubbles in the glue plane")).toEqual(["nature: composite, positive"]);
});

test("a denial is no finding, and a feature says nothing of a species that it does not occur in", () => {
  expect(said("corundum", "no curved striae, no gas bubbles; not a flash effect")).toEqual([]);
  expect(said("quartz", "Curved striae")).toEqual([]);
  expect(said(null, "Curved striae")).toEqual([]);
});

test("what proves nothing is told so", () => {
  expect(of("corundum", "straight zoning", "inclusion-free").silent.map(({ feature }) => feature)).toEqual(["straight zoning", "no inclusions"]);
  expect(of("corundum", "intact silk").silent[0]!.saysNothingOf).toContain("low temperature");
});

test("proof of a synthetic beside a natural stone's feature is a conflict, and a reason to refer", () => {
  const { conflicts } = of("corundum", "curved striae", "zircon crystals with halos");
  expect(conflicts).toHaveLength(1);
  expect(referralReasons({ speciesId: "corundum", variety: "", hasConflict: true })).toEqual(["the findings contradict each other"]);
  expect(referralReasons({ speciesId: "corundum", variety: "ruby", hasConflict: false })).toHaveLength(1);
  expect(referralReasons({ speciesId: "corundum", variety: "", hasConflict: false })).toEqual([]);
  expect(referralReasons({ speciesId: "quartz", variety: "citrine", hasConflict: false })).toEqual([]);
});

test("while no variety is named, the stone may be any of its species, and all its triggers are told", () => {
  expect(referralReasons({ speciesId: "corundum", variety: null, hasConflict: false })[0]).toMatch(/ruby or sapphire/);
  expect(referralReasons({ speciesId: "beryl", variety: null, hasConflict: false })[0]).toMatch(/emerald/);
  expect(referralReasons({ speciesId: "quartz", variety: null, hasConflict: false })).toEqual([]);
  expect(referralReasons({ speciesId: null, variety: null, hasConflict: false })).toEqual([]);
});

test("no constant is among the features, and every species named is in the table", () => {
  const ids = new Set(loadSpeciesTable().table.nodes.map(({ id }) => id));
  for (const { meanings, name } of features) {
    expect(name).not.toMatch(/index|density|birefringence/i);
    for (const { species } of meanings) if (species !== "any") for (const id of species) expect(ids, `${name}: ${id}`).toContain(id);
  }
});

test("what no bench can decide is listed for those species that it matters for", () => {
  expect(beyondBench("corundum")).toContain("heating at low temperature");
  expect(beyondBench("topaz")).toEqual(["irradiation"]);
  expect(beyondBench("zircon-high")).toEqual(["heating"]);
  expect(beyondBench(null)).toEqual([]);
});
