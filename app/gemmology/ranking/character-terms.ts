import type { TabulatedCharacter } from "../species/species-row.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { OpticCharacter } from "./evidence.ts";
import { probable, seenTerm } from "./seen-term.ts";
import type { Term } from "./term.ts";

/**
 * P(observed | true) between crossed polars, for a trained eye; rows sum to 1 (house values, common practice). A uniaxial
 * or biaxial figure is seldom mistaken for another; looking down an axis makes a doubly refractive stone stay dark.
 */
const confusion: Readonly<Record<"single" | "uniaxial" | "biaxial" | "aggregate", Readonly<Record<OpticCharacter, number>>>> = {
  single: { isotropic: 0.8, anomalous: 0.155, uniaxial: 0.0005, biaxial: 0.0005, anisotropic: 0.02, aggregate: 0.024 },
  uniaxial: { isotropic: 0.02, anomalous: 0.025, uniaxial: 0.45, biaxial: 0.015, anisotropic: 0.45, aggregate: 0.04 },
  biaxial: { isotropic: 0.015, anomalous: 0.025, uniaxial: 0.015, biaxial: 0.45, anisotropic: 0.455, aggregate: 0.04 },
  aggregate: { isotropic: 0.03, anomalous: 0.05, uniaxial: 0.01, biaxial: 0.01, anisotropic: 0.1, aggregate: 0.8 },
};
const rowOf: Readonly<Record<TabulatedCharacter, keyof typeof confusion>> = { isotropic: "single", amorphous: "single", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };
const characterNames: Readonly<Record<OpticCharacter, string>> = {
  isotropic: "singly refractive",
  anomalous: "singly refractive, anomalous",
  uniaxial: "uniaxial",
  biaxial: "biaxial",
  anisotropic: "doubly refractive",
  aggregate: "aggregate",
};
const tabulatedNames: Readonly<Record<TabulatedCharacter, string>> = { isotropic: "singly refractive", amorphous: "singly refractive", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };

export function opticCharacterTerm(observed: OpticCharacter): Term {
  return {
    ...seenTerm("opticCharacter", characterNames[observed], 0.4),
    score: ({ character }) => probable(character.reduce((sum, each) => sum + confusion[rowOf[each]][observed], 0) / character.length),
    reference: (forms) => [...new Set(forms.flatMap(({ character }) => character.map((each) => tabulatedNames[each])))].join(" or "),
    contradiction: (form) => `${[...new Set(form.character.map((each) => tabulatedNames[each]))].join(" or ")}, the stone is ${characterNames[observed]}`,
  };
}

export function opticSignTerm(observed: "+" | "-"): Term {
  const words = { "+": "positive", "-": "negative" } as const;
  return {
    ...seenTerm("opticSign", words[observed], 0.5),
    score: ({ sign }) => probable(sign === "±" ? 0.5 : sign === null ? 0.05 : sign === observed ? 0.95 : 0.05),
    reference: (forms) => [...new Set(forms.map(({ sign }) => (sign === null ? "none" : sign === "±" ? "either" : words[sign])))].join(" or "),
    contradiction: ({ sign }) => (sign === null ? "it has no optic sign" : `its sign is ${sign === "±" ? "either" : words[sign]}`),
  };
}

/** Singly refractive whatever specimen of it is met. */
export const isSingle = ({ character }: SpeciesForm) => character.every((each) => rowOf[each] === "single");
export const isBiaxial = ({ character }: SpeciesForm) => character.includes("biaxial");
