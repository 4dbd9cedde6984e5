import type { ReadingDetail } from "#app/domain/reading.ts";

export type SeenCharacter = "isotropic" | "anomalous" | "uniaxial" | "biaxial" | "anisotropic" | "aggregate";
type Polariscope = Extract<ReadingDetail, { kind: "polariscope" }>;

/** What a turn between crossed polars, and the figure if one was found, say of the stone; undefined where they say nothing. */
export function characterOf({ behaviour, figure }: Polariscope): SeenCharacter | undefined {
  if (figure === "uniaxial" || figure === "uniaxialHollowCentre") return "uniaxial";
  if (figure === "biaxial") return "biaxial";
  return ({ dark: "isotropic", blinks: "anisotropic", staysLight: "aggregate", anomalous: "anomalous", cannotTell: undefined } as const)[behaviour];
}

const words: Readonly<Record<SeenCharacter, string>> = {
  isotropic: "singly refractive",
  anomalous: "anomalous double refraction",
  uniaxial: "uniaxial",
  biaxial: "biaxial",
  anisotropic: "doubly refractive",
  aggregate: "aggregate",
};

export function characterWords(character: SeenCharacter): string {
  return words[character];
}
