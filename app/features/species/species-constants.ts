import { formatInterval } from "#app/domain/format-interval.ts";
import { constantSources, type Constant } from "#app/gemmology/species/constant-sources.ts";
import type { Range, SpeciesRow } from "#app/gemmology/species/species-row.ts";
import { opticWords } from "./optic-words.ts";

/** One constant of a form, with the places in the list of sources that it was compared with; none: from memory. */
export type ConstantLine = Readonly<{ label: string; value: string; /** The value to expect first, where a range is given. */ usual: string | null; note: string | null; sources: readonly number[] }>;
export type SpeciesConstants = Readonly<{ lines: readonly ConstantLine[]; sources: readonly string[] }>;

const indexNames = { n: "Index n", omega: "Index ω", epsilon: "Index ε", alpha: "Index α", beta: "Index β", gamma: "Index γ", spot: "Spot reading" } as const;

/** The constants of one form as a reader wants to see them, each with where it comes from. */
export function speciesConstants(row: SpeciesRow): SpeciesConstants {
  const sources = constantSources(row);
  const from = (constant: Constant | null) => (constant === null ? [] : sources.flatMap(({ constants }, at) => (constants.includes(constant) ? [at + 1] : [])));
  const lines: ConstantLine[] = [];
  const add = (label: string, value: string | null, { usual = null, note = null, constant = null }: { usual?: string | null; note?: string | null; constant?: Constant | null }) => {
    if (value) lines.push({ label, value, usual, note: note ?? null, sources: from(constant) });
  };
  const addRange = (label: string, range: Range | null | undefined, { decimals, ...rest }: { decimals: number; note?: string | null; constant: Constant }) => {
    if (range) add(label, formatInterval([range.min, range.max], decimals), { usual: range.min === range.max ? null : range.typ.toFixed(decimals), ...rest });
  };

  const indices = (Object.keys(indexNames) as (keyof typeof indexNames)[]).filter((name) => row.ri?.[name]);
  indices.forEach((name, at) => addRange(indexNames[name], row.ri?.[name], { decimals: 3, constant: "index", note: at === indices.length - 1 ? (row.ri_note ?? null) : null }));
  if (indices.length === 0) add("Index", "not read: opaque and metallic", { note: row.ri_note ?? null });
  const isSingle = row.birefringence?.max === 0;
  if (isSingle) add("Birefringence", "none", { note: row.birefringence_note ?? null });
  else addRange("Birefringence", row.birefringence, { decimals: 3, constant: "birefringence", note: row.birefringence_note ?? null });
  const characters = typeof row.optic_character === "string" ? [row.optic_character] : row.optic_character;
  add("Character and sign", opticWords([{ character: characters, sign: row.optic_sign }]), { note: row.optic_sign_note ?? null });
  if (row.two_v) add("2V", `${formatInterval([row.two_v.min, row.two_v.max], 0)}°`, { constant: "twoV" });
  if (row.dispersion_BG !== null) add("Dispersion, B–G", row.dispersion_BG.toFixed(3), { constant: "dispersion", note: row.dispersion_note ?? null });
  addRange("Density", row.sg, { decimals: 2, constant: "sg", note: row.sg_note ?? null });
  if (row.hardness) add("Hardness, Mohs", row.hardness.min === row.hardness.max ? String(row.hardness.min) : `${row.hardness.min}–${row.hardness.max}`, { constant: "hardness", note: row.hardness_note });
  return { lines, sources: sources.map(({ citation }) => citation) };
}
