export type Range = Readonly<{ min: number; typ: number; max: number }>;
export type SpeciesKind = "natural" | "synthetic" | "artificial" | "composite" | "organic" | "rock";
export type TabulatedCharacter = "isotropic" | "uniaxial" | "biaxial" | "aggregate" | "amorphous";

/** One form of a gem material as `fixtures/species/species.json` holds it; only what the program reads is typed here. */
export type SpeciesRow = Readonly<{
  id: string;
  name: string;
  group: string;
  kind: SpeciesKind;
  formula: string | null;
  crystal_system: string | null;
  optic_character: TabulatedCharacter | readonly TabulatedCharacter[];
  optic_sign: "+" | "-" | "±" | null;
  ri: Readonly<Partial<Record<"n" | "omega" | "epsilon" | "alpha" | "beta" | "gamma" | "spot", Range>>> | null;
  birefringence: Range | null;
  birefringence_note?: string | null;
  optic_sign_note?: string | null;
  ri_note?: string | null;
  two_v: Readonly<{ min: number; max: number }> | null;
  /** n(430.8 nm) − n(686.7 nm), as gem tables give it. */
  dispersion_BG: number | null;
  dispersion_note?: string | null;
  sg: Range | null;
  sg_note?: string | null;
  /** Mohs. */
  hardness: Readonly<{ min: number; max: number }> | null;
  hardness_note: string | null;
  cleavage: string | null;
  fracture: string | null;
  colours: readonly string[];
  transparency: readonly string[];
  lustre: readonly string[];
  pleochroism: ReadonlyArray<Readonly<{ colour_variety: string; strength: "none" | "weak" | "distinct" | "strong"; colours: readonly string[] }>> | null;
  absorption: readonly Absorption[];
  fluorescence: Readonly<{ lw: readonly Fluorescence[]; sw: readonly Fluorescence[]; note?: string | null }>;
  colour_filter: Readonly<Record<string, string>> | null;
  thermal: string | null;
  phenomena: readonly string[];
  inclusions_diagnostic: readonly string[];
  treatments_common: readonly string[];
  synthetics_known: boolean;
  /** Another row, and what separates this one from it. */
  separated_from: ReadonlyArray<Readonly<{ id: string; by: string }>>;
  trade_names: readonly string[];
  misleading_names: readonly string[];
  cautions: readonly string[];
  prevalence: number;
  sources: readonly string[];
}>;
/** Strength 1 weak or often missing, 2 clear, 3 strong; `nm` is the centre, of a cut-off the edge. */
export type Absorption = Readonly<{ nm: number; kind: "line" | "band" | "cutoff"; width_nm?: number | null; strength: number; colour_variety?: string | null; cause?: string | null }>;
export type Fluorescence = Readonly<{ colour: string | null; strength: number; strength_min?: number; colour_variety?: string | null }>;

/** A species of the ranking and the forms that are told apart under it. */
export type NodeRow = Readonly<{ id: string; name: string; rows: readonly string[] }>;
/** Species that bench constants cannot separate, and what does. */
export type LookalikeRow = Readonly<{ id: string; members: readonly string[]; shared: string; bench: readonly string[]; laboratory: readonly string[] }>;
/** A name a report must avoid: the rows it is used for, and those it pretends to. */
export type MisleadingName = Readonly<{ name: string; means: readonly string[]; claims: readonly string[]; note: string | null }>;
