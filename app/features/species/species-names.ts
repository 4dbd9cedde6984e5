/** What a name stands for: the species itself, a form of it, a trade's or variety name, a family, or a name that reports avoid. */
export type NameKind = "species" | "form" | "trade" | "family" | "misleading";

/** One name by which a species is found, as it is sent to a browser. */
export type SpeciesName = Readonly<{ name: string; kind: NameKind; speciesId: string; formId: string | null; note?: string }>;

/** Every name of the table; the version names the content. */
export type SpeciesNames = Readonly<{ version: string; species: Readonly<Record<string, string>>; names: readonly SpeciesName[] }>;

/** A species that a search found, with the name that found it. */
export type FoundSpecies = Readonly<{ speciesId: string; speciesName: string; by: SpeciesName }>;

export const nameKindWords: Readonly<Record<NameKind, string>> = { species: "species", form: "form", trade: "trade name", family: "family", misleading: "misleading name" };
