import type { Fluorescence, SpeciesRow } from "#app/gemmology/species/species-row.ts";

/** What a row says of one property, a phrase an item; several rows together say each phrase once. Empty: nothing is known. */
export type PropertyWords = (rows: readonly SpeciesRow[]) => string[];

const strengthWords = ["inert", "weak", "moderate", "strong"] as const;

export const colourWords: PropertyWords = each(({ colours }) => colours);
export const transparencyWords: PropertyWords = each(({ transparency }) => transparency);
export const lustreWords: PropertyWords = each(({ lustre }) => lustre);
export const phenomenonWords: PropertyWords = each(({ phenomena }) => phenomena.filter((one) => one !== "none usual"));
export const cleavageWords: PropertyWords = each(({ cleavage }) => (cleavage ? [cleavage] : []));
export const fractureWords: PropertyWords = each(({ fracture }) => (fracture ? [fracture] : []));
export const inclusionWords: PropertyWords = each(({ inclusions_diagnostic: inclusions }) => inclusions);
export const treatmentWords: PropertyWords = each(({ treatments_common: treatments }) => treatments);
export const thermalWords: PropertyWords = each(({ thermal }) => (thermal ? [thermal] : []));
export const longWaveWords: PropertyWords = each(({ fluorescence }) => fluorescence.lw.map(glow));
export const shortWaveWords: PropertyWords = each(({ fluorescence }) => fluorescence.sw.map(glow));
export const filterWords: PropertyWords = each(({ colour_filter: filter }) => Object.entries(filter ?? {}).map(([variety, look]) => `${variety.replaceAll("_", " ")}: ${look}`));
export const pleochroismWords: PropertyWords = each(({ pleochroism }) =>
  (pleochroism ?? []).map(({ colour_variety: variety, strength, colours }) => `${variety}: ${strength}${colours.length > 0 ? `, ${colours.join(" and ")}` : ""}`),
);
/** Clear and strong lines and bands; the weak ones are often missing. */
export const absorptionWords: PropertyWords = each(({ absorption }) =>
  absorption.filter(({ strength }) => strength > 1).map(({ nm, kind, colour_variety: variety }) => `${nm} nm ${kind === "cutoff" ? "cut-off" : kind}${variety ? ` (${variety})` : ""}`),
);

function glow({ colour, strength, strength_min: least, colour_variety: variety }: Fluorescence): string {
  const [from, to] = [strengthWords[least ?? strength], strengthWords[strength]];
  const seen = strength === 0 ? "inert" : `${from === to ? to : `${from} to ${to}`}${colour ? ` ${colour}` : ""}`;
  return variety ? `${seen} (${variety})` : seen;
}

function each(read: (row: SpeciesRow) => readonly string[]): PropertyWords {
  return (rows) => [...new Set(rows.flatMap(read))];
}
