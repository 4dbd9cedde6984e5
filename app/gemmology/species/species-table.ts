import type { HarmfulTest } from "./test-harm.ts";
import type { SpeciesKind, TabulatedCharacter } from "./species-row.ts";

/** A closed interval, low ≤ high. */
export type Interval = readonly [low: number, high: number];

/**
 * One form of a species with what the ranking reads, small enough to be sent to a browser. Indices for 589.3 nm; density
 * relative to water at 4 °C. Null: no trustworthy value, or the property does not apply.
 */
export type SpeciesForm = Readonly<{
  id: string;
  name: string;
  kind: SpeciesKind;
  /** Share of the node's weight, from how common the form is; the shares of a node sum to 1. */
  share: number;
  character: readonly TabulatedCharacter[];
  sign: "+" | "-" | "±" | null;
  /** Least and greatest principal index, each with its range in this form; equal for one index. */
  lowIndex: Interval | null;
  highIndex: Interval | null;
  /** What a spot reading of a dome or an aggregate shows. */
  spotIndex: Interval | null;
  birefringence: Interval | null;
  sg: Interval | null;
  /** What is usual within those ranges. */
  usual: Readonly<Partial<Record<"lowIndex" | "highIndex" | "spotIndex" | "birefringence" | "sg", number>>>;
  colours: readonly string[];
  transparency: readonly string[];
  lustre: readonly string[];
  /** Strongest pleochroism of any variety, 0 none to 3 strong. */
  pleochroism: number;
  /** nm, half width nm, strength 1–3. */
  absorption: ReadonlyArray<readonly [nm: number, halfWidthNm: number, strength: number]>;
  /** Strengths 0–3 that occur. */
  longWave: readonly number[];
  shortWave: readonly number[];
  /** Whether any variety looks red through the colour filter; null where nothing is known. */
  filterRed: boolean | null;
  thermal: string | null;
  phenomena: readonly string[];
  /** A member of a solid solution, whose index and density rise together with composition. */
  isSeries: boolean;
  /** Tests of the bench that can damage it. */
  harmedBy: readonly HarmfulTest[];
}>;

export type SpeciesNode = Readonly<{ id: string; name: string; /** Prior weight by prevalence, before normalising. */ weight: number; forms: readonly SpeciesForm[] }>;
export type Lookalike = Readonly<{ speciesIds: readonly string[]; settledBy: string }>;
export type SpeciesTable = Readonly<{ version: string; nodes: readonly SpeciesNode[]; lookalikes: readonly Lookalike[] }>;
