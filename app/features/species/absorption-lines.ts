import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";

/** What the table says a species absorbs, to be drawn above what was seen. */
export type AbsorbingSpecies = Readonly<{ speciesId: string; name: string; lines: readonly Pick<SpectrumLine, "nm" | "halfWidthNm" | "strength" | "isEmission">[] }>;

const strengths = { 1: "weak", 2: "medium", 3: "strong" } as const;
/** Narrower than this a half width is that of a line. */
const widestLineHalfNm = 3;

/** The lines and bands of species in the order asked for; those without any are left out. Several forms of one species are drawn over each other. */
export function absorptionLines(table: SpeciesTable, speciesIds: readonly string[]): AbsorbingSpecies[] {
  return speciesIds.flatMap((speciesId) => {
    const node = table.nodes.find(({ id }) => id === speciesId);
    const strongest = new Map<string, AbsorbingSpecies["lines"][number]>();
    for (const [nm, halfWidthNm, strength] of (node?.forms ?? []).flatMap(({ absorption }) => absorption.flatMap(({ lines }) => lines)).toSorted((a, b) => a[2] - b[2])) {
      const drawnHalfNm = halfWidthNm <= widestLineHalfNm ? 0 : halfWidthNm;
      strongest.set(`${nm}/${drawnHalfNm}`, { nm, halfWidthNm: drawnHalfNm, strength: strengths[strength as 1 | 2 | 3] ?? "weak", isEmission: false });
    }
    return node && strongest.size > 0 ? [{ speciesId, name: node.name, lines: [...strongest.values()].sort((a, b) => a.nm - b.nm) }] : [];
  });
}
