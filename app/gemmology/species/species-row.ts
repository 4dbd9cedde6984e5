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
  optic_character: TabulatedCharacter | readonly TabulatedCharacter[];
  optic_sign: "+" | "-" | "±" | null;
  ri: Readonly<Partial<Record<"n" | "omega" | "epsilon" | "alpha" | "beta" | "gamma" | "spot", Range>>> | null;
  birefringence: Range | null;
  two_v: Readonly<{ min: number; max: number }> | null;
  sg: Range | null;
  colours: readonly string[];
  transparency: readonly string[];
  lustre: readonly string[];
  pleochroism: ReadonlyArray<Readonly<{ colour_variety: string; strength: "none" | "weak" | "distinct" | "strong"; colours: readonly string[] }>> | null;
  absorption: ReadonlyArray<Readonly<{ nm: number; kind: "line" | "band" | "cutoff"; width_nm?: number | null; strength: number }>>;
  fluorescence: Readonly<{ lw: readonly Fluorescence[]; sw: readonly Fluorescence[] }>;
  colour_filter: Readonly<Record<string, string>> | null;
  thermal: string | null;
  phenomena: readonly string[];
  prevalence: number;
  sources: readonly string[];
}>;
type Fluorescence = Readonly<{ colour: string | null; strength: number; strength_min?: number }>;

/** A species of the ranking and the forms that are told apart under it. */
export type NodeRow = Readonly<{ id: string; name: string; rows: readonly string[] }>;
/** Species that bench constants cannot separate, and what does. */
export type LookalikeRow = Readonly<{ id: string; members: readonly string[]; shared: string; bench: readonly string[]; laboratory: readonly string[] }>;
