import { readFileSync } from "node:fs";
import type { SpeciesRow } from "#app/gemmology/species/species-row.ts";

/** A value as a named source prints it, of one row of the table. */
export type HandbookCheck = Readonly<{ id: string; property: string; low: number; high: number; source: string }>;

/** fixtures/species/handbook-checks.csv: five columns, the last one quoted where it holds a comma. */
export function handbookChecks(): HandbookCheck[] {
  const [, ...lines] = readFileSync("fixtures/species/handbook-checks.csv", "utf8").trim().split("\n");
  return lines.map((line) => {
    const [, id, property, low, high, quoted, bare] = /^([^,]*),([^,]*),([^,]*),([^,]*),(?:"(.*)"|(.*))$/.exec(line)!;
    return { id: id!, property: property!, low: Number(low), high: Number(high), source: (quoted ?? bare!).replaceAll('""', '"') };
  });
}

type Span = readonly [low: number, high: number];
const own = (range: Readonly<{ min: number; max: number }> | null | undefined): Span | null => (range ? [range.min, range.max] : null);

/** What the table says of the same property; null where it says nothing. */
export function tabulated(row: SpeciesRow, property: string): Span | null {
  if (property === "birefringence" || property === "sg" || property === "hardness") return own(row[property]);
  if (property === "two_v") return own(row.two_v);
  if (property === "dispersion_BG") return row.dispersion_BG === null ? null : [row.dispersion_BG, row.dispersion_BG];
  const key = property.slice("ri_".length);
  const all = Object.values(row.ri ?? {}).flatMap((range) => (range ? [range] : []));
  if (all.length === 0) return null;
  const principal = row.ri as Readonly<Record<string, Readonly<{ min: number; max: number }> | undefined>>;
  if (principal[key]) return own(principal[key]);
  const around: Span = [Math.min(...all.map(({ min }) => min)), Math.max(...all.map(({ max }) => max))];
  const [least, greatest] = [all.reduce((a, b) => (a.min <= b.min ? a : b)), all.reduce((a, b) => (a.max >= b.max ? a : b))];
  return key === "least" ? own(least) : key === "greatest" ? own(greatest) : around;
}

/** How much a printed value may lie outside and still agree: rounding and reading of its time (common practice). */
export function tolerance({ property, low, high }: HandbookCheck): number {
  if (property.startsWith("ri_")) return property === "ri_mean" || [low, high].some((each) => Math.abs(each * 100 - Math.round(each * 100)) < 1e-6) ? 0.006 : 0.003;
  return { birefringence: 0.002, sg: 0.02, hardness: 0.25, dispersion_BG: 0.002, two_v: 4 }[property]!;
}
