import { colourFamiliesOf, type ColourFamily } from "#app/gemmology/species/colour-families.ts";
import type { SpeciesKind } from "#app/gemmology/species/species-row.ts";
import { speciesSpan, type SpeciesSpan } from "#app/gemmology/species/species-span.ts";
import type { SpeciesForm, SpeciesNode } from "#app/gemmology/species/species-table.ts";
import { formFits } from "./form-fits.ts";
import { loadSpeciesNames } from "./load-species-names.server.ts";
import { loadSpeciesTable } from "./load-species-table.server.ts";
import { opticWords } from "./optic-words.ts";
import type { SpeciesFilter, SpeciesQuery } from "./species-filter.ts";
import type { FoundSpecies } from "./species-names.ts";

/** A species in the list: what its forms that answer the question span. */
export type SpeciesLine = Readonly<{
  id: string;
  name: string;
  forms: ReadonlyArray<Readonly<{ id: string; name: string }>>;
  kinds: readonly SpeciesKind[];
  optics: string;
  span: SpeciesSpan;
  colours: readonly ColourFamily[];
  /** The name that found it, where it is not its own. */
  foundBy: FoundSpecies["by"] | null;
}>;

type Fitting = Readonly<{ node: SpeciesNode; forms: readonly SpeciesForm[]; foundBy: FoundSpecies["by"] | null; rank: number }>;

const pageSize = 50;

/** One page of the species that answer, with the ids to go on from. The table is in memory; nothing is asked from the database. */
export function listSpecies(query: SpeciesQuery): { species: SpeciesLine[]; total: number; tableSize: number; earlier: string | null; later: string | null; namesVersion: string } {
  const all = fittingSpecies(query).sort(orderOf(query));
  const at = (id: string | undefined) => (id === undefined ? -1 : all.findIndex(({ node }) => node.id === id));
  const [after, before] = [at(query.after), at(query.before)];
  const start = after >= 0 ? after + 1 : before >= 0 ? Math.max(0, before - pageSize) : 0;
  const page = all.slice(start, start + pageSize);
  return {
    species: page.map(lineOf),
    total: all.length,
    tableSize: loadSpeciesTable().table.nodes.length,
    // An empty "before" leads to the first page.
    earlier: start === 0 ? null : start <= pageSize ? "" : page[0]!.node.id,
    later: start + pageSize < all.length ? page.at(-1)!.node.id : null,
    namesVersion: loadSpeciesNames().version,
  };
}

/** Each form that answers, with its species, in the order of the list: for the export. */
export function* eachFittingForm(query: SpeciesQuery): Generator<{ node: SpeciesNode; form: SpeciesForm }> {
  for (const { node, forms } of fittingSpecies(query).sort(orderOf(query))) for (const form of forms) yield { node, form };
}

function fittingSpecies(filter: SpeciesFilter): Fitting[] {
  const { table } = loadSpeciesTable();
  const found = filter.words.trim() === "" ? null : new Map(loadSpeciesNames().search(filter.words).map((hit, rank) => [hit.speciesId, { ...hit, rank }]));
  return table.nodes.flatMap((node) => {
    const hit = found?.get(node.id);
    if (found && !hit) return [];
    const forms = node.forms.filter((form) => formFits(form, filter));
    return forms.length === 0 ? [] : [{ node, forms, foundBy: hit && hit.by.kind !== "species" ? hit.by : null, rank: hit?.rank ?? 0 }];
  });
}

function lineOf({ node, forms, foundBy }: Fitting): SpeciesLine {
  return {
    id: node.id,
    name: node.name,
    forms: forms.map(({ id, name }) => ({ id, name })),
    kinds: [...new Set(forms.map(({ kind }) => kind))],
    optics: opticWords(forms),
    span: speciesSpan(forms),
    colours: colourFamiliesOf(forms.flatMap(({ colours }) => colours)),
    foundBy,
  };
}

function orderOf({ sort, direction }: SpeciesQuery) {
  const turn = direction === "desc" ? -1 : 1;
  const key: Record<typeof sort, (one: Fitting) => number | null> = {
    found: ({ rank }) => rank,
    name: () => 0,
    index: ({ forms }) => speciesSpan(forms).index?.[0] ?? null,
    birefringence: ({ forms }) => speciesSpan(forms).birefringence?.[1] ?? null,
    density: ({ forms }) => speciesSpan(forms).sg?.[0] ?? null,
    prevalence: ({ node }) => node.weight,
  };
  return (one: Fitting, other: Fitting): number => {
    const [a, b] = [key[sort](one), key[sort](other)];
    // What has no value stands last whichever way the list runs.
    if (a === null || b === null) return Number(a === null) - Number(b === null) || byName(one, other);
    return (a - b) * turn || byName(one, other) * (sort === "name" ? turn : 1);
  };
}

const byName = (one: Fitting, other: Fitting) => one.node.name.localeCompare(other.node.name, "en") || (one.node.id < other.node.id ? -1 : 1);
