import type { Evidence } from "../ranking/evidence.ts";
import type { HarmfulTest } from "../species/test-harm.ts";

export const benchTestIds = ["edges", "spot", "polariscope", "figure", "density", "dichroscope", "longWave", "shortWave", "colourFilter", "thermalProbe"] as const;
export type BenchTestId = (typeof benchTestIds)[number];

/** What is known of the stone before a test: it decides how sharp the test would be. */
export type StoneAtBench = Readonly<{ massCt: number | null; uAirCt: number; uWaterCt: number; isPolished: boolean }>;

/** A test that could be made next. */
export type BenchTest = Readonly<{
  id: BenchTestId;
  name: string;
  minutes: number;
  harms: HarmfulTest | null;
  /** What may be seen, in pieces that do not depend on each other; each piece is a list of outcomes. Empty: the test says nothing of this stone. */
  outcomes: (stone: StoneAtBench, spans: Readonly<{ index: readonly [number, number]; sg: readonly [number, number] }>) => ReadonlyArray<readonly Evidence[]>;
}>;
