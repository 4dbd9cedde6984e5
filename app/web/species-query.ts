import { parseDecimal } from "#app/domain/decimal.ts";
import { characterFilters, kindFilters, phenomenonFilters, signFilters, speciesSorts, transparencyFilters, type Asked, type SpeciesQuery } from "#app/features/species/species-filter.ts";
import { colourFamilies } from "#app/gemmology/species/colour-families.ts";

export const speciesRangeNames = ["index", "density", "birefringence"] as const;
export type SpeciesRangeName = (typeof speciesRangeNames)[number];

/** The list's question as its address has it, and what was typed there and is no number. */
export type SpeciesAddress = Readonly<{ query: SpeciesQuery; typed: Readonly<Record<string, string>>; errors: Readonly<Partial<Record<SpeciesRangeName, string>>> }>;

/** Filters, order and place of the species list; a choice that makes no sense is left out, a number that is none is said. */
export function readSpeciesQuery(params: URLSearchParams): SpeciesAddress {
  const errors: Partial<Record<SpeciesRangeName, string>> = {};
  const one = <T extends string>(name: string, known: readonly T[]) => known.find((value) => value === params.get(name));
  const text = (name: string) => (params.get(name) ?? "").trim().slice(0, 20);
  const range = (name: SpeciesRangeName): Asked => {
    const ends = (["From", "To"] as const).map((end) => {
      const typed = text(name + end);
      const value = typed === "" ? undefined : parseDecimal(typed);
      if (typed !== "" && value === undefined) errors[name] = `“${typed}” is not a number.`;
      return value;
    });
    const [from, to] = ends;
    if (from !== undefined && to !== undefined && from > to) errors[name] = "The first value is above the second: they were turned round.";
    return from !== undefined && to !== undefined && from > to ? { from: to, to: from } : { from, to };
  };
  const words = (params.get("name") ?? "").trim().slice(0, 60);
  const sort = one("sort", speciesSorts) ?? (words === "" ? "name" : "found");
  const id = (name: string) => (/^[a-z0-9-]{1,60}$/.test(params.get(name) ?? "") ? params.get(name)! : undefined);
  const query: SpeciesQuery = {
    words,
    index: range("index"),
    sg: range("density"),
    birefringence: range("birefringence"),
    character: one("character", characterFilters),
    sign: one("sign", signFilters),
    colour: one("colour", colourFamilies),
    kind: one("kind", kindFilters),
    transparency: one("transparency", transparencyFilters),
    phenomenon: one("phenomenon", phenomenonFilters),
    sort: sort === "found" && words === "" ? "name" : sort,
    direction: one("direction", ["asc", "desc"] as const) ?? (sort === "prevalence" ? "desc" : "asc"),
    after: id("after"),
    before: id("before"),
  };
  const typed = Object.fromEntries([
    ["name", words],
    ...speciesRangeNames.flatMap((name) => ["From", "To"].map((end) => [name + end, text(name + end)])),
    ...(["character", "sign", "colour", "kind", "transparency", "phenomenon"] as const).map((name) => [name, query[name] ?? ""]),
  ]) as Record<string, string>;
  return { query, typed, errors };
}
