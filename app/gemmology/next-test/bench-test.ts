import type { Evidence, RotationCrystal } from "../ranking/evidence.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { HarmfulTest } from "../species/test-harm.ts";

export const benchTestIds = ["edges", "spot", "polariscope", "figure", "density", "dichroscope", "longWave", "shortWave", "colourFilter", "thermalProbe", "spectroscope", "magnet", "brewster", "depth", "polariser", "secondFacet"] as const;
export type BenchTestId = (typeof benchTestIds)[number];

/** What is known of the stone before a test: it decides how sharp the test would be. */
export type StoneAtBench = Readonly<{
  massCt: number | null;
  uAirCt: number;
  uWaterCt: number;
  isPolished: boolean;
  /** An edge that the refractometer could not reach. */
  isOverLimit?: boolean;
  /** The crystals that a rotation run on one facet left open; none, or one, where there is nothing to decide. */
  undecided?: readonly RotationCrystal[];
}>;

/** A test that could be made next. */
export type BenchTest = Readonly<{
  id: BenchTestId;
  name: string;
  minutes: number;
  harms: HarmfulTest | null;
  /** What may be seen, in pieces that do not depend on each other; each piece is a list of outcomes. Empty: the test says nothing of this stone. */
  outcomes: (stone: StoneAtBench, likely: Likely) => ReadonlyArray<readonly Evidence[]>;
  /** How much of what may be seen an outcome stands for, where outcomes are not of one size. */
  sizeOf?: (outcome: Evidence) => number;
}>;

/** What the species that are still likely span, and their forms. */
export type Likely = Readonly<{ index: readonly [number, number]; sg: readonly [number, number]; forms: readonly SpeciesForm[] }>;
