import { expect, test } from "vitest";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import { nextTestsForStone } from "#app/features/identification/next-tests-for-stone.ts";
import { rankStone } from "#app/features/identification/rank-stone.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { aBench, aReading } from "../../setup/bench-factory.ts";
import { aLab } from "../../setup/factories.ts";

const { table } = loadSpeciesTable();

/** One edge at 1.620 in a transparent stone that is doubly refractive: topaz, tourmaline and others. */
async function aStone(consents: ConsentCode[]) {
  const ctx = await aLab();
  const bench = await aBench(ctx, { consents: ["contactLiquid"], massText: "5.000" });
  await recordReading(ctx, aReading(bench, { kind: "weight", quality: "good", weightCt: "5.000" }));
  await recordReading(ctx, aReading(bench, { kind: "refractometer", quality: "good", edges: "two", low: "1.616", high: "1.624", isRotated: false, facet: "table", light: "sodium" }));
  const { stone, instruments } = await getBench(ctx, bench);
  const readings = await listReadings(ctx, bench);
  return { next: nextTestsForStone(readings, table, { ...stone, consents, instruments }), ranked: (await rankStone(ctx, { readings })).bench };
}

test("what would tell most comes first, with the form that records it", async () => {
  const { next } = await aStone(["contactLiquid", "hydrostatic"]);
  expect(next.recommended.length).toBeGreaterThan(0);
  for (const { kind, settles, bits } of next.recommended) {
    expect(["refractometer", "spot", "polariscope", "density"]).toContain(kind);
    expect(settles).toMatch(/^tells .+ from .+$/);
    expect(bits).toBeGreaterThan(0);
  }
});

test("a test that the client did not agree to is named and not recommended", async () => {
  const { next } = await aStone(["dryCloth"]);
  expect(next.recommended.map(({ testId }) => testId)).not.toContain("density");
  expect(next.vetoed).toContainEqual(expect.objectContaining({ testId: "density", because: "the client has not agreed to weighing in water" }));
});

test("without a reading there is nothing to go by", () => {
  expect(nextTestsForStone([], table, { weightText: "5.000", isMounted: false, mount: "loose", consents: [], instruments: [] })).toEqual({ recommended: [], vetoed: [] });
});

// Facet 1 of the rotation examples: quartz, or a biaxial twin with the middle index at 1.5504, as some iolite has it.
test("a rotation run that one facet leaves open asks for the polariser, where that would tell the likely species apart", () => {
  const crystals = [1.5443, 1.5504].map((beta) => ({ indices: { alpha: 1.5443, beta, gamma: 1.5534 }, u: 0.0012, weight: 1 }));
  const run = (solutions: typeof crystals) => [{ sequence: 1, quality: "good" as const, values: [], strike: null, detail: { kind: "rotation" as const, light: "sodium" as const, rows: "", character: "undetermined" as const, sign: null, solutions } }];
  const stone = { weightText: "2.000", isMounted: false, mount: "loose", consents: ["dryCloth"] as ConsentCode[], instruments: [] };
  const named = (solutions: typeof crystals) => nextTestsForStone(run(solutions), table, stone, { prior: "even" }).vetoed.filter(({ testId }) => testId === "polariser" || testId === "secondFacet");
  expect(named(crystals)).toEqual([
    { testId: "polariser", name: "Polariser on the rotation run", because: "the client has not agreed to a contact liquid" },
    { testId: "secondFacet", name: "Rotation on a second facet", because: "the client has not agreed to a contact liquid" },
  ]);
  expect(named(crystals.slice(0, 1))).toEqual([]);
});
