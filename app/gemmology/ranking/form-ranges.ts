import type { Interval, SpeciesForm } from "../species/species-table.ts";

/** From the least to the greatest index of a form, whatever it is read with. */
export function hull(form: SpeciesForm): Interval | null {
  if (form.lowIndex && form.highIndex) return [form.lowIndex[0], form.highIndex[1]];
  return form.spotIndex;
}

/** What a spot or any rough way shows of a form: a dome's own range taken together with the principal indices. */
export function roughIndex(form: SpeciesForm): Interval | null {
  const edges = hull(form);
  if (!form.spotIndex || !edges) return edges;
  return [Math.min(form.spotIndex[0], edges[0]), Math.max(form.spotIndex[1], edges[1])];
}

/** What one edge or a spot shows of a form most: the middle of its usual indices. */
export function usualIndex({ usual: { lowIndex, highIndex, spotIndex } }: SpeciesForm): number | undefined {
  return spotIndex ?? (lowIndex !== undefined && highIndex !== undefined ? (lowIndex + highIndex) / 2 : undefined);
}

/** The widest range over forms, written with so many decimals. */
export function written(ranges: readonly Interval[], decimals: number): string {
  if (ranges.length === 0) return "";
  const low = Math.min(...ranges.map(([least]) => least));
  const high = Math.max(...ranges.map(([, most]) => most));
  return low === high ? low.toFixed(decimals) : `${low.toFixed(decimals)}–${high.toFixed(decimals)}`;
}

export function outOfRange(noun: string, distance: number): string {
  const times = Math.abs(distance) >= 100 ? "more than 100" : Math.abs(distance).toFixed(Math.abs(distance) < 10 ? 1 : 0);
  return `${noun} too ${distance > 0 ? "high" : "low"} by ${times} standard uncertainties`;
}
