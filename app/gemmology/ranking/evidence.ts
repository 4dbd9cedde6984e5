export type RefractiveEvidence =
  | Readonly<{ kind: "edges"; low: number; high: number; u?: number; rotated: boolean }>
  | Readonly<{ kind: "single"; n: number; u?: number }>
  | Readonly<{ kind: "spot"; n: number; u?: number }>
  | Readonly<{ kind: "criticalAngle"; angleDeg: number; prismN: number; u?: number }>
  | Readonly<{ kind: "overLimit"; limit: number }>;

export const opticCharacters = ["isotropic", "anomalous", "uniaxial", "biaxial", "anisotropic", "aggregate"] as const;
export type OpticCharacter = (typeof opticCharacters)[number];
export const strengths = ["none", "weak", "moderate", "strong"] as const;
export const fluorescenceStrengths = ["inert", "weak", "moderate", "strong"] as const;
export const magneticResponses = ["inert", "weak", "moderate", "strong"] as const;

/** What was seen and measured of one stone, version 1. Every part is optional; `u` is a standard uncertainty. */
export type Evidence = Readonly<{
  id?: string;
  ri?: readonly RefractiveEvidence[];
  birefringence?: Readonly<{ value: number; u?: number }>;
  opticCharacter?: OpticCharacter;
  opticSign?: "+" | "-";
  sg?: Readonly<{ value: number; u?: number }>;
  colour?: readonly string[];
  transparency?: string;
  lustre?: string;
  pleochroism?: Readonly<{ strength: (typeof strengths)[number]; colours?: readonly string[] }>;
  fluorescence?: Readonly<{ longWave?: Fluorescence; shortWave?: Fluorescence }>;
  absorption?: ReadonlyArray<Readonly<{ nm: number; kind: "line" | "band" }>>;
  colourFilter?: string;
  phenomena?: readonly string[];
  thermal?: "diamond-like" | "inert";
  magnetic?: (typeof magneticResponses)[number];
  features?: readonly string[];
}>;
type Fluorescence = Readonly<{ strength: (typeof fluorescenceStrengths)[number]; colour?: string }>;
