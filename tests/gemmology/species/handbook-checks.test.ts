import { expect, test } from "vitest";
import disagreements from "#fixtures/species/disagreements.json" with { type: "json" };
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { handbookChecks, tabulated, tolerance, type HandbookCheck } from "./handbook-checks.ts";

const rows = new Map(loadSpeciesTable().rows.map((row) => [row.id, row]));
const checks = handbookChecks();
const nameOf = ({ id, property, low }: Pick<HandbookCheck, "id" | "property" | "low">) => `${id} ${property} ${low}`;

/** A printed value, or range, that the row's range does not meet. */
function disagrees(check: HandbookCheck): boolean {
  const range = tabulated(rows.get(check.id)!, check.property);
  if (!range) return true;
  const slack = tolerance(check) + 1e-9;
  return check.high < range[0] - slack || check.low > range[1] + slack;
}

test("870 printed values are there, each with its source, of rows that are in the table", () => {
  expect(checks).toHaveLength(870);
  for (const { id, low, high, source } of checks) {
    expect(rows.has(id), id).toBe(true);
    expect(low).toBeLessThanOrEqual(high);
    expect(source).toMatch(/.{10}/);
  }
});

test("the table agrees with every printed value, but for those that were looked into and decided", () => {
  const decided = new Set(disagreements.map(nameOf));
  expect([...new Set(checks.filter(disagrees).map(nameOf))].filter((name) => !decided.has(name))).toEqual([]);
});

test("what was decided still disagrees, and says why", () => {
  const found = new Set(checks.filter(disagrees).map(nameOf));
  for (const each of disagreements) {
    expect(found, nameOf(each)).toContain(nameOf(each));
    expect(["table", "both"]).toContain(each.trust);
    expect(each.because.length).toBeGreaterThan(20);
  }
});
