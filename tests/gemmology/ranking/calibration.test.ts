import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import type { Interval, SpeciesForm } from "#app/gemmology/species/species-table.ts";
import { sized } from "../../setup/torture.ts";
import { randomFrom } from "../rotation/a-rotation-run.ts";

const { table } = loadSpeciesTable();
const { even, normal } = randomFrom(42);

/** One of a list by its weights. */
function drawn<T>(all: readonly T[], weightOf: (each: T) => number): T {
  let left = even() * all.reduce((sum, each) => sum + weightOf(each), 0);
  return all.find((each) => (left -= weightOf(each)) < 0) ?? all.at(-1)!;
}

/** Half anywhere in the range, half about the usual value, as the table is meant. */
function value(range: Interval, usual: number | undefined): number {
  const [low, high] = range;
  return usual === undefined || even() < 0.5 ? low + even() * (high - low) : usual + (normal() * (high - low)) / 6;
}

/** What an operator reads of a stone of such a form; errors as assumed of good readings, the table's own softness included. */
function readingsOf(form: SpeciesForm): Evidence {
  const read = (x: number, u: number, softness: number) => x + normal() * Math.hypot(u, softness);
  const slips = () => even() < 0.01;
  const birefringence = form.birefringence && form.birefringence[1] > 0 ? Math.max(0, read(value(form.birefringence, form.usual.birefringence), 0.0012, 0.0008)) : 0;
  const low = form.lowIndex && form.lowIndex[1] < 1.79 ? read(value(form.lowIndex, form.usual.lowIndex), 0.0015, 0.0015) : null;
  const sg = form.sg && Math.max(0.6, slips() ? 1 + even() * 6 : read(value(form.sg, form.usual.sg), 0.03, 0.02));
  return {
    ...(low !== null && birefringence > 0.006 && even() < 0.7 && { ri: [{ kind: "edges" as const, low, high: low + birefringence, rotated: true }] }),
    ...(sg !== null && even() < 0.7 && { sg: { value: sg, u: 0.03 } }),
  };
}

// Stones of the table itself: this holds the reckoning, not the table, to account.
test("of what is stated of stones drawn from the table, as much is so as was stated, within 5 points in every bin of 100 or more", { timeout: 240_000 }, () => {
  const stated: Array<{ probability: number; isTrue: boolean }> = [];
  // Mixed crystals are left to their own test: there index and density move together.
  const nodes = table.nodes.filter(({ forms }) => !forms.some(({ isSeries }) => isSeries));
  for (let at = 0; at < sized({ always: 2_500, whole: 25_000 }); at++) {
    const node = drawn(nodes, ({ weight }) => weight);
    const evidence = readingsOf(drawn(node.forms, ({ share }) => share));
    if (Object.keys(evidence).length === 0) continue;
    for (const { speciesId, probability } of rankSpecies(evidence, { ...table, nodes }).candidates) if (probability > 0.02) stated.push({ probability, isTrue: speciesId === node.id });
  }
  const bins = Array.from({ length: 10 }, (_, bin) => stated.filter(({ probability }) => Math.min(9, Math.floor(probability * 10)) === bin));
  const judged = bins.filter(({ length }) => length >= 100);
  expect(judged.length).toBeGreaterThanOrEqual(5);
  for (const bin of judged) {
    const [said, was] = [bin.reduce((sum, { probability }) => sum + probability, 0) / bin.length, bin.filter(({ isTrue }) => isTrue).length / bin.length];
    // Two standard deviations of chance on top.
    expect(Math.abs(said - was), `stated ${said.toFixed(3)}, was ${was.toFixed(3)} of ${bin.length}`).toBeLessThan(0.05 + 2 * Math.sqrt((said * (1 - said)) / bin.length));
  }
});
