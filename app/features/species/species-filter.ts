import type { ColourFamily } from "#app/gemmology/species/colour-families.ts";
import type { SpeciesKind, TabulatedCharacter } from "#app/gemmology/species/species-row.ts";

export const speciesSorts = ["found", "name", "index", "birefringence", "density", "prevalence"] as const;
export type SpeciesSort = (typeof speciesSorts)[number];

/** What the polariscope shows, as a filter: what looks alike there is one choice. */
export const characterFilters = ["single", "double", "uniaxial", "biaxial", "aggregate"] as const;
export type CharacterFilter = (typeof characterFilters)[number];
export const characterFilterNames: Readonly<Record<CharacterFilter, string>> = { single: "singly refractive", double: "doubly refractive", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };
export const charactersOf: Readonly<Record<CharacterFilter, readonly TabulatedCharacter[]>> = {
  single: ["isotropic", "amorphous"],
  double: ["uniaxial", "biaxial"],
  uniaxial: ["uniaxial"],
  biaxial: ["biaxial"],
  aggregate: ["aggregate"],
};

export const kindFilters = ["natural", "synthetic", "artificial", "composite", "organic", "rock"] as const satisfies readonly SpeciesKind[];
export const kindNames: Readonly<Record<SpeciesKind, string>> = { natural: "natural", synthetic: "synthetic", artificial: "artificial", composite: "composite", organic: "organic", rock: "rock" };
export const transparencyFilters = ["transparent", "translucent", "opaque"] as const;
export const phenomenonFilters = ["asterism", "chatoyancy", "colour change", "adularescence", "labradorescence", "play of colour", "iridescence", "aventurescence", "orient"] as const;
export const signFilters = ["+", "-"] as const;
export const signFilterNames = { "+": "positive", "-": "negative" } as const;

/** A range that is asked for; a missing end is open. */
export type Asked = Readonly<{ from?: number; to?: number }>;

/** What a list of species is asked for. One form of a species must answer all of it. */
export type SpeciesFilter = Readonly<{
  words: string;
  index: Asked;
  sg: Asked;
  birefringence: Asked;
  character?: CharacterFilter;
  sign?: (typeof signFilters)[number];
  colour?: ColourFamily;
  kind?: SpeciesKind;
  transparency?: (typeof transparencyFilters)[number];
  phenomenon?: (typeof phenomenonFilters)[number];
}>;
export type SpeciesQuery = SpeciesFilter & Readonly<{ sort: SpeciesSort; direction: "asc" | "desc"; after?: string; before?: string }>;
