import { expect, test } from "vitest";
import { parseRotationRun } from "#app/gemmology/rotation/parse-rotation-run.ts";

const run = (reading: object) => ({ facets: [{ label: "table", readings: [{ angleDeg: 0, upper: 1.64, lower: 1.62, ...reading }] }] });

test("a run is read, with what is usual where nothing is said", () => {
  expect(parseRotationRun(run({}))).toEqual({ ok: true, run: { facets: [{ label: "table", readings: [{ angleDeg: 0, upper: 1.64, lower: 1.62, u: 0.0015, polariserDeg: null }] }] } });
  expect(parseRotationRun(run({ upper: null })).ok).toBe(true);
});

test.each([
  [run({ colour: "red" }), "facets[0].readings[0].colour"],
  [run({ upper: 0.9 }), "facets[0].readings[0].upper"],
  [run({ lower: 1.7 }), "facets[0].readings[0].lower"],
  [run({ upper: null, lower: null }), "facets[0].readings[0]"],
  [run({ angleDeg: "12" }), "facets[0].readings[0].angleDeg"],
  [run({ u: 0 }), "facets[0].readings[0].u"],
  [{ facets: [] }, "facets"],
  [{ facets: [{ readings: [] }] }, "facets"],
  [{ ...run({}), stone: 1 }, "stone"],
  [null, ""],
  [[], ""],
])("%j is refused at %s", (value, path) => {
  const parsed = parseRotationRun(value);
  expect(parsed.ok).toBe(false);
  if (!parsed.ok) expect(parsed.errors.map((error) => error.path)).toContain(path);
});
