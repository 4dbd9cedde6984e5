import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { checkSpeciesRows } from "#app/gemmology/species/check-species-rows.ts";

const { rows, table } = loadSpeciesTable();

test("every row keeps the rules of physics and names its sources", () => {
  expect(checkSpeciesRows(rows)).toEqual([]);
});

test("every row belongs to one species, and the shares of a species sum to one", () => {
  expect(table.nodes.flatMap(({ forms }) => forms).length).toBe(rows.length);
  for (const node of table.nodes) expect(node.forms.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
});

test.each([
  ["an index out of order", { ri: { n: { min: 1.6, typ: 1.5, max: 1.7 } } }, /out of order/],
  ["no source", { sources: [] }, /no source/],
  ["a birefringence of singly refractive material", { optic_character: "isotropic" as const, birefringence: { min: 0, typ: 0.01, max: 0.02 } }, /singly refractive/],
])("%s is found", (_what, fault, message) => {
  expect(checkSpeciesRows([{ ...rows[0]!, ...fault }]).join("\n")).toMatch(message);
});
