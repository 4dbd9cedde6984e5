import { speciesSpan } from "#app/gemmology/species/species-span.ts";
import type { Interval, SpeciesTable } from "#app/gemmology/species/species-table.ts";

/** A species as a box of index and density. */
export type SpeciesBox = Readonly<{ id: string; name: string; index: Interval; sg: Interval; /** How common it is, before normalising. */ weight: number }>;

/** Every species of the table that has both an index and a density; the others by name. */
export function speciesBoxes({ nodes }: Pick<SpeciesTable, "nodes">): { boxes: SpeciesBox[]; unplaced: { id: string; name: string }[] } {
  const boxes: SpeciesBox[] = [];
  const unplaced: { id: string; name: string }[] = [];
  for (const { id, name, weight, forms } of nodes) {
    const { index, sg } = speciesSpan(forms);
    if (index && sg) boxes.push({ id, name, index, sg, weight });
    else unplaced.push({ id, name });
  }
  return { boxes, unplaced };
}
