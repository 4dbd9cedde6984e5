import { expect, test } from "vitest";
import { loadSpeciesNames } from "#app/features/species/load-species-names.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { foldName } from "#app/features/species/search-species-names.ts";

const { search, misleading, names, species } = loadSpeciesNames();
const { rows } = loadSpeciesTable();
const firstOf = (words: string) => search(words)[0]?.speciesId;

// Old trade names and what they mean: 16 CFR 23 (2018) and the trade's nomenclature warn of them; the meanings are common practice.
test.each([
  ["Evening emerald", "peridot"],
  ["Balas ruby", "spinel"],
  ["Spinel ruby", "spinel"],
  ["Water sapphire", "iolite"],
  ["Lux sapphire", "iolite"],
  ["Cape ruby", "garnet-pyrope"],
  ["American ruby", "garnet-pyrope"],
  ["Uralian emerald", "garnet-andradite"],
  ["Lithia emerald", "spodumene"],
  ["Oriental emerald", "corundum"],
  ["Oriental topaz", "corundum"],
  ["King topaz", "corundum"],
  ["Oriental amethyst", "corundum"],
  ["Madeira topaz", "quartz"],
  ["Smoky topaz", "quartz"],
  ["Herkimer diamond", "quartz"],
  ["Alaska black diamond", "hematite"],
  ["Matura diamond", "zircon-high"],
  ["Transvaal jade", "garnet-hydrogrossular"],
  ["Korean jade", "serpentine"],
  ["Indian jade", "quartzite"],
  ["Australian jade", "chalcedony"],
  ["California jade", "vesuvianite"],
  ["Swiss lapis", "chalcedony"],
  ["Amazon jade", "amazonite"],
  ["White turquoise", "howlite"],
  ["Black onyx", "chalcedony"],
])("“%s” finds %s and not what it pretends to be", (name, speciesId) => {
  expect(firstOf(name)).toBe(speciesId);
});

test("a misleading name is shown as one, with the form it means", () => {
  expect(search("evening emerald")[0]).toMatchObject({ speciesName: "Peridot (olivine)", by: { kind: "misleading", name: "Evening emerald", formId: "peridot" } });
});

test.each([
  ["corundum", "corundum"],
  ["ruby", "corundum"],
  ["tanzanite", "zoisite"],
  ["alexandrite", "chrysoberyl"],
  ["paraiba", "tourmaline"],
  ["cordierite", "iolite"],
  ["emerald", "beryl"],
  ["quartz", "quartz"],
  ["opal", "opal"],
  ["zircon", "zircon-high"],
  ["hauyne", "hauyne"],
  ["HAÜYNE", "hauyne"],
  ["cats eye", "chrysoberyl"],
])("“%s” finds what rightly bears the name first", (words, speciesId) => {
  expect(firstOf(words)).toBe(speciesId);
});

test.each([
  ["tanzanit", "zoisite"],
  ["tourmalin", "tourmaline"],
  ["saphire", "corundum"],
  ["spodumeen", "spodumene"],
  ["evning emerald", "peridot"],
  ["herkimmer diamond", "quartz"],
])("a slip of the keys is forgiven: “%s”", (words, speciesId) => {
  expect(search(words, 5).map((found) => found.speciesId)).toContain(speciesId);
});

test("a family finds all its species, and words that name nothing find nothing", () => {
  expect(search("garnet").filter(({ speciesId }) => speciesId.startsWith("garnet") || ["spessartine", "uvarovite"].includes(speciesId)).length).toBeGreaterThanOrEqual(9);
  expect(search("zzzzqqqq")).toEqual([]);
  expect(search("  ’ ")).toEqual([]);
  expect(search("x".repeat(500))).toEqual([]);
});

test("every name of the table finds its own species", () => {
  const lost = names.filter(({ kind }) => kind !== "family").filter(({ name, speciesId }) => !search(name).some((found) => found.speciesId === speciesId));
  expect(lost).toEqual([]);
});

test("every misleading name of every row stands in the list of misleading names, and says what it means or claims", () => {
  const known = new Map(misleading.map((entry) => [foldName(entry.name), entry]));
  const absent = rows.flatMap((row) =>
    row.misleading_names.flatMap((text) => {
      const entry = known.get(foldName(text.replace(/ \(.*\)$/, "")));
      return entry && [...entry.means, ...entry.claims].includes(row.id) ? [] : [`${row.id}: ${text}`];
    }),
  );
  expect(absent).toEqual([]);
  for (const { name, means, claims } of misleading) {
    expect(means.length + claims.length, name).toBeGreaterThan(0);
    for (const id of [...means, ...claims]) expect(rows.some((row) => row.id === id), `${name}: ${id}`).toBe(true);
  }
});

// The median, not the 95th percentile: the machine that runs the tests does other things as well.
test("a search takes less than 6 ms, guessing included", () => {
  const words = ["emerald", "evning emrald", "sapphire", "tourmalin", "herkimmer", "ja", "cats eye", "spessartite garnet", "zirkon", "wter saphire"];
  const times = Array.from({ length: 200 }, (_, at) => {
    const start = performance.now();
    search(words[at % words.length]!, 8);
    return performance.now() - start;
  }).sort((a, b) => a - b);
  expect(times[Math.floor(times.length * 0.5)]).toBeLessThan(6);
});

test("names lead to species of the table, each once a species", () => {
  expect(new Set(names.map(({ name, speciesId }) => `${speciesId} ${name.toLowerCase()}`)).size).toBe(names.length);
  for (const { speciesId } of names) expect(species[speciesId]).toBeTruthy();
});
