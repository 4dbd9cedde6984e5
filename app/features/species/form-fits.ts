import { colourFamiliesOf } from "#app/gemmology/species/colour-families.ts";
import { indexInterval } from "#app/gemmology/species/species-span.ts";
import type { Interval, SpeciesForm } from "#app/gemmology/species/species-table.ts";
import { charactersOf, type Asked, type SpeciesFilter } from "./species-filter.ts";

/** Whether one form answers every property that is asked for. A value that is not known answers no range. */
export function formFits(form: SpeciesForm, filter: SpeciesFilter): boolean {
  const { character, sign, colour, kind, transparency, phenomenon } = filter;
  return (
    reaches(indexInterval(form), filter.index) &&
    reaches(form.sg, filter.sg) &&
    reaches(form.birefringence, filter.birefringence) &&
    (!character || form.character.some((each) => charactersOf[character].includes(each))) &&
    (!sign || form.sign === sign || form.sign === "±") &&
    (!colour || colourFamiliesOf(form.colours).includes(colour)) &&
    (!kind || form.kind === kind) &&
    (!transparency || form.transparency.includes(transparency)) &&
    (!phenomenon || form.phenomena.some((each) => each.startsWith(phenomenon) || each.includes(`, ${phenomenon}`)))
  );
}

function reaches(interval: Interval | null, { from, to }: Asked): boolean {
  if (from === undefined && to === undefined) return true;
  return interval !== null && interval[1] >= (from ?? -Infinity) && interval[0] <= (to ?? Infinity);
}
