import { expect, test } from "vitest";
import { compareSpecies } from "#app/features/species/compare-species.ts";
import { getComparison } from "#app/features/species/get-comparison.server.ts";
import { getSpecies } from "#app/features/species/get-species.server.ts";
import { eachFittingForm, listSpecies } from "#app/features/species/list-species.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { SpeciesQuery } from "#app/features/species/species-filter.ts";

const all: SpeciesQuery = { words: "", index: {}, sg: {}, birefringence: {}, sort: "name", direction: "asc" };
const { table, rows } = loadSpeciesTable();
const idsOf = (query: Partial<SpeciesQuery>) => [...new Set([...eachFittingForm({ ...all, ...query })].map(({ node }) => node.id))];

test("a walk through the pages meets every species once, in order, and can turn back", () => {
  const met: string[] = [];
  let after: string | undefined;
  for (let page = 0; page < 10; page += 1) {
    const { species, later } = listSpecies({ ...all, after });
    met.push(...species.map(({ id }) => id));
    if (!later) break;
    after = later;
  }
  expect(met).toEqual(idsOf({}));
  expect(new Set(met).size).toBe(table.nodes.length);
  const second = listSpecies({ ...all, after: met[49] });
  expect(second.earlier).toBe("");
  expect(listSpecies({ ...all, before: met[100] }).species.map(({ id }) => id)).toEqual(met.slice(50, 100));
});

test("one form answers all that is asked: a red stone of index 1.77 that is singly refractive is a garnet, not a ruby", () => {
  const ids = idsOf({ colour: "red", index: { from: 1.765, to: 1.775 }, character: "single" });
  expect(ids).toContain("garnet-almandine");
  expect(ids).not.toContain("corundum");
});

test("a range that is asked for is met by overlap, and what has no value answers no range", () => {
  expect(idsOf({ index: { from: 2.4, to: 2.43 }, sg: { to: 3.6 } })).toEqual(["diamond", "doublet-diamond"]);
  expect(idsOf({ index: { from: 1 } })).not.toContain("pyrite");
  expect(idsOf({})).toContain("pyrite");
});

test("a sign that may be either answers both", () => {
  expect(idsOf({ sign: "+" })).toContain("amblygonite");
  expect(idsOf({ sign: "-" })).toContain("amblygonite");
});

test("sorted by index up and down, what has none stands last", () => {
  const lowest = (id: string) => Math.min(...table.nodes.find((node) => node.id === id)!.forms.flatMap(({ lowIndex, spotIndex }) => lowIndex ?? spotIndex ?? []));
  for (const direction of ["asc", "desc"] as const) {
    const values = idsOf({ sort: "index", direction }).map(lowest);
    const known = values.filter(Number.isFinite);
    expect(known).toEqual(known.toSorted((a, b) => (direction === "asc" ? a - b : b - a)));
    expect(values.slice(known.length)).toEqual([Infinity, Infinity, Infinity]);
  }
});

test("a species' page shows the most common form unless another is asked for", () => {
  expect(getSpecies({ speciesId: "corundum", formId: null }).form.id).toBe("ruby");
  expect(getSpecies({ speciesId: "corundum", formId: "corundum-star" }).form.id).toBe("corundum-star");
  expect(getSpecies({ speciesId: "corundum", formId: "emerald" }).form.id).toBe("ruby");
  expect(() => getSpecies({ speciesId: "unobtainium", formId: null })).toThrow("There is no such species");
});

test("every species has a page, every constant its value, every link its target", () => {
  for (const { id, forms } of table.nodes) {
    for (const { id: formId } of forms) {
      const sheet = getSpecies({ speciesId: id, formId });
      expect(sheet.form.constants.lines.length, formId).toBeGreaterThan(2);
      for (const { sources } of sheet.form.constants.lines) for (const number of sources) expect(sheet.form.constants.sources[number - 1], formId).toBeTruthy();
      for (const link of [...sheet.theyShow, ...sheet.itShows, ...sheet.alike.flatMap(({ others }) => others), ...sheet.notThis.flatMap(({ means }) => means)]) expect(table.nodes.some((node) => node.id === link.speciesId && node.forms.some((form) => form.id === link.formId))).toBe(true);
    }
  }
});

test("the page of ruby says what its false names mean, and how spinel is told from it", () => {
  const sheet = getSpecies({ speciesId: "corundum", formId: "ruby" });
  expect(sheet.notThis.find(({ name }) => name === "Balas ruby")?.means).toMatchObject([{ speciesId: "spinel", formId: "spinel-red" }]);
  expect(sheet.theyShow.find(({ formId }) => formId === "spinel-red")?.by).toContain("isotropic");
  expect(sheet.form.light.map(({ index }) => index)).toEqual(["ω", "ε"]);
});

const column = (speciesId: string, formId?: string) => {
  const forms = table.nodes.find(({ id }) => id === speciesId)!.forms.filter(({ id }) => !formId || id === formId);
  return { forms, rows: forms.map(({ id }) => rows.find((row) => row.id === id)!) };
};
const likenessOf = (columns: Parameters<typeof compareSpecies>[0]) => Object.fromEntries(compareSpecies(columns).map(({ property, likeness }) => [property, likeness]));

test("ranges that share no value are apart, those that share some overlap, equal ones are alike", () => {
  expect(likenessOf([column("corundum", "ruby"), column("peridot")])).toMatchObject({ lowIndex: "apart", birefringence: "apart", sg: "apart", optics: "differs" });
  expect(likenessOf([column("corundum", "ruby"), column("corundum", "sapphire-blue")])).toMatchObject({ lowIndex: "alike", highIndex: "alike" });
  expect(likenessOf([column("garnet-almandine"), column("garnet-pyrope-almandine")])).toMatchObject({ lowIndex: "overlapping" });
  expect(likenessOf([column("peridot"), column("corundum", "ruby"), column("corundum", "sapphire-blue")])).toMatchObject({ lowIndex: "someApart" });
});

test("a column without a value leaves the property open and is never called apart from the others", () => {
  expect(likenessOf([column("pyrite"), column("peridot")])).toMatchObject({ lowIndex: "open" });
});

test("a conventional value without a range is never called apart", () => {
  expect(likenessOf([column("corundum", "ruby"), column("taaffeite")]).dispersion).toBe("differs");
});

test("the order of columns changes no verdict", () => {
  const [one, two, three] = [column("spinel"), column("taaffeite"), column("garnet-pyrope")];
  expect(likenessOf([one, two, three])).toEqual(likenessOf([three, one, two]));
});

test("no more than four stand side by side, none twice, and what is unknown is left out", () => {
  const refs = ["corundum", "corundum", "nothing", "spinel", "beryl", "quartz", "topaz"].map((speciesId) => ({ speciesId, formId: null }));
  expect(getComparison(refs).columns.map(({ ref }) => ref)).toEqual(["corundum", "spinel", "beryl", "quartz"]);
  expect(getComparison([{ speciesId: "peridot", formId: "peridot" }]).columns[0]!.ref).toBe("peridot");
  expect(getComparison([]).rows).toEqual([]);
});
