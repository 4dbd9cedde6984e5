import type { HeavyLiquidObservation } from "../density/heavy-liquid.ts";

/** How well a reading could be taken: it decides how large a share of blunders is allowed for. */
export const readingGrades = ["good", "fair", "poor"] as const;
export type ReadingGrade = (typeof readingGrades)[number];
type Graded = Readonly<{ quality?: ReadingGrade }>;

/** Ways to an index where a refractometer cannot reach. */
export const estimateWays = ["brewster", "reflectance", "depth", "immersion"] as const;
export type EstimateWay = (typeof estimateWays)[number];

/** One crystal that a rotation run allows: its principal indices, the standard uncertainty of each, and its weight among the solutions (1 each where left out). */
export type RotationCrystal = Readonly<{
  indices: Readonly<{ n: number } | { omega: number; epsilon: number } | { alpha: number; beta: number; gamma: number }>;
  u?: number;
  weight?: number;
}>;

export type RefractiveEvidence = Graded &
  (
    | Readonly<{ kind: "edges"; low: number; high: number; u?: number; rotated: boolean }>
    | Readonly<{ kind: "single"; n: number; u?: number }>
    | Readonly<{ kind: "spot"; n: number; u?: number }>
    /** Known only to lie between two marks, as in distant vision. */
    | Readonly<{ kind: "interval"; low: number; high: number; u?: number }>
    | Readonly<{ kind: "criticalAngle"; angleDeg: number; prismN: number; u?: number }>
    | Readonly<{ kind: "overLimit"; limit: number }>
    /** What a rotation run allows: both crystals where one facet cannot decide. */
    | Readonly<{ kind: "rotation"; solutions: readonly RotationCrystal[] }>
    | Readonly<{ kind: "estimate"; n: number; u: number; by: EstimateWay }>
  );

export const opticCharacters = ["isotropic", "anomalous", "uniaxial", "biaxial", "anisotropic", "aggregate"] as const;
export type OpticCharacter = (typeof opticCharacters)[number];
export const strengths = ["none", "weak", "moderate", "strong"] as const;
export const fluorescenceStrengths = ["inert", "weak", "moderate", "strong"] as const;
export const magneticResponses = ["inert", "weak", "moderate", "strong"] as const;

/** What was seen and measured of one stone, version 1. Every part is optional; `u` is a standard uncertainty. */
export type Evidence = Readonly<{
  id?: string;
  ri?: readonly RefractiveEvidence[];
  birefringence?: Readonly<{ value: number; u?: number }> & Graded;
  opticCharacter?: OpticCharacter;
  opticSign?: "+" | "-";
  sg?: Readonly<{ value: number; u?: number }> & Graded;
  heavyLiquids?: readonly HeavyLiquidObservation[];
  colour?: readonly string[];
  transparency?: string;
  lustre?: string;
  pleochroism?: Readonly<{ strength: (typeof strengths)[number]; colours?: readonly string[] }>;
  fluorescence?: Readonly<{ longWave?: Fluorescence; shortWave?: Fluorescence }>;
  /** Empty: looked for, none seen. */
  absorption?: readonly AbsorptionSeen[];
  colourFilter?: string;
  phenomena?: readonly string[];
  thermal?: "diamond-like" | "inert";
  magnetic?: (typeof magneticResponses)[number];
  features?: readonly string[];
}>;
export type Fluorescence = Readonly<{ strength: (typeof fluorescenceStrengths)[number]; colour?: string }>;
/** `u`: the spectroscope's, nm; 2 nm, in the red 3 nm where left out. */
export type AbsorptionSeen = Readonly<{ nm: number; kind: "line" | "band"; u?: number }>;
