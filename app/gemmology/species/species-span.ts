import type { Interval, SpeciesForm } from "./species-table.ts";

/** What all forms together span; null where no form has the property. Indices are for 589.3 nm. */
export type SpeciesSpan = Readonly<{ index: Interval | null; birefringence: Interval | null; sg: Interval | null }>;

/** The least and the greatest of each constant over the given forms; a spot reading stands in where there are no principal indices. */
export function speciesSpan(forms: readonly SpeciesForm[]): SpeciesSpan {
  return {
    index: around(forms.flatMap((form) => indexInterval(form) ?? [])),
    birefringence: around(forms.flatMap(({ birefringence }) => birefringence ?? [])),
    sg: around(forms.flatMap(({ sg }) => sg ?? [])),
  };
}

/** From the least value of the least index to the greatest of the greatest. */
export function indexInterval({ lowIndex, highIndex, spotIndex }: SpeciesForm): Interval | null {
  return around([...(lowIndex ?? spotIndex ?? []), ...(highIndex ?? [])]);
}

function around(values: readonly number[]): Interval | null {
  return values.length === 0 ? null : [Math.min(...values), Math.max(...values)];
}
