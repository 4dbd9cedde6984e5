import type { SpeciesForm } from "#app/gemmology/species/species-table.ts";

const characterWords = { isotropic: "singly refractive", amorphous: "amorphous", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" } as const;
const signMarks = { "+": "+", "-": "−", "±": "±" } as const;

/** Character and sign of some forms in words: "uniaxial −", "biaxial ± or aggregate". */
export function opticWords(forms: ReadonlyArray<Pick<SpeciesForm, "character" | "sign">>): string {
  const characters = [...new Set(forms.flatMap(({ character }) => character))];
  return characters
    .map((character) => {
      const signs = new Set(forms.filter((form) => form.character.includes(character)).flatMap(({ sign }) => sign ?? []));
      const isSigned = (character === "uniaxial" || character === "biaxial") && signs.size > 0;
      return isSigned ? `${characterWords[character]} ${signMarks[signs.size > 1 ? "±" : [...signs][0]!]}` : characterWords[character];
    })
    .join(" or ");
}
