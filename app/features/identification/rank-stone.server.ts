import type { LabContext } from "#app/features/lab-context.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import type { ReadingView } from "#app/features/readings/reading-view.ts";
import type { RankOptions } from "#app/gemmology/ranking/rank-species.ts";
import { requireRole } from "#app/features/require-role.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { Contradiction } from "./conclusion-gate.ts";
import { contradictingReadings, rankingSnapshot, rankReadings } from "./rank-readings.ts";

/** Reasons that go out with a page; the rest is the browser's to work out from the table, if anybody asks. */
const mostReasons = 30;

/**
 * The ranking of a stone from what was saved, by the rules of who may see it.
 *
 * @param readings those of the stone that the caller has read already; read here where left out
 * @param prior by how common species are, or "even"; the first where left out
 */
export async function rankStone(ctx: LabContext, input: ({ stoneCode: string } | { readings: readonly ReadingView[]; compare?: readonly string[] }) & RankOptions) {
  requireRole(ctx, "readings.read");
  const readings = "readings" in input ? input.readings : (await listReadings(ctx, input)).filter(({ isOfSecondCheck }) => !isOfSecondCheck);
  const { table } = loadSpeciesTable();
  const options: RankOptions = input.prior ? { prior: input.prior } : {};
  return {
    bench: rankReadings(readings, table, { mostReasons, ...options, ...("compare" in input && { compare: input.compare }) }),
    snapshot: () => rankingSnapshot(readings, table, options),
    tableVersion: table.version,
    /** Good readings that contradict a species by themselves. */
    contradictionsOf: (speciesId: string): Contradiction[] =>
      (contradictingReadings(readings.filter(({ quality }) => quality === "good"), table).get(speciesId) ?? []).flatMap(({ sequence, because }) => (sequence === null ? [] : [{ sequence, because }])),
  };
}

/** The species of the table that a person's words name; null where they name none. */
export function findSpeciesId(words: string): string | null {
  const name = words.trim().toLowerCase();
  const { table } = loadSpeciesTable();
  return table.nodes.find((node) => node.name.toLowerCase() === name || node.id === name || node.forms.some((form) => form.name.toLowerCase() === name))?.id ?? null;
}

export function listSpeciesNames(): string[] {
  return loadSpeciesTable().table.nodes.map(({ name }) => name).sort();
}
