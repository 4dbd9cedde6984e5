import type { HarmfulTest } from "./test-harm.ts";
import type { SpeciesKind, TabulatedCharacter } from "./species-row.ts";

/** A closed interval, low ≤ high. */
export type Interval = readonly [low: number, high: number];

/** Lines and bands of one colour variety: nm, half width nm, strength 1 weak or often missing to 3 strong. `colours` is a colour mask, 0 for any. */
export type VarietySpectrum = Readonly<{ colours: number; lines: ReadonlyArray<readonly [nm: number, halfWidthNm: number, strength: number]> }>;
/** Strengths 0 inert to 3 strong, and the glow's colour mask, 0 where it is inert or not known. */
export type Glow = readonly [least: number, most: number, colours: number];

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
  /** (β − α)/(γ − α); an end for uniaxial crystals, null where there are no axes. */
  betaShare: Interval | null;
  sg: Interval | null;
  /** What is usual within those ranges. */
  usual: Readonly<Partial<Record<"lowIndex" | "highIndex" | "spotIndex" | "birefringence" | "sg", number>>>;
  colours: readonly string[];
  transparency: readonly string[];
  lustre: readonly string[];
  /** Strongest pleochroism of any variety, 0 none to 3 strong. */
  pleochroism: number;
  /** Spectra that occur, one a colour variety. */
  absorption: readonly VarietySpectrum[];
  /** Alternatives that occur. */
  longWave: readonly Glow[];
  shortWave: readonly Glow[];
  /** Whether any variety looks red through the colour filter; null where nothing is known. */
  filterRed: boolean | null;
  thermal: string | null;
  /** Iron or manganese is part of its formula, so that a strong magnet is likely to draw it. */
  isMagnetic: boolean;
  phenomena: readonly string[];
  /** A member of a solid solution, whose index and density rise together with composition. */
  isSeries: boolean;
  /** Tests of the bench that can damage it. */
  harmedBy: readonly HarmfulTest[];
}>;

export type SpeciesNode = Readonly<{ id: string; name: string; /** Prior weight by prevalence, before normalising. */ weight: number; forms: readonly SpeciesForm[] }>;
export type Lookalike = Readonly<{ speciesIds: readonly string[]; settledBy: string }>;
export type SpeciesTable = Readonly<{ version: string; nodes: readonly SpeciesNode[]; lookalikes: readonly Lookalike[] }>;
