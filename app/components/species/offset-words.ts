import type { MapReading } from "#app/components/charts/species-map/species-map.tsx";
import type { SpeciesBox } from "#app/features/species/species-boxes.ts";
import { readingOffset } from "#app/gemmology/species/reading-offset.ts";

/** Within two standard uncertainties a reading and a range agree. */
const agreesWithinU = 2;

/** How a species lies to the reading: in a sentence, and as one number to sort by, in units of u. */
export function offsetWords({ index, sg }: Pick<SpeciesBox, "index" | "sg">, reading: MapReading): { sentence: string; isNear: boolean; distanceU: number } {
  const byIndex = reading.index && readingOffset(reading.index, index);
  const bySg = reading.sg && readingOffset(reading.sg, sg);
  const parts = [
    byIndex && byIndex.gap !== 0 ? `index ${Math.abs(byIndex.gap).toFixed(3)} ${byIndex.gap > 0 ? "higher" : "lower"}` : "",
    bySg && bySg.gap !== 0 ? `density ${Math.abs(bySg.gap).toFixed(2)} ${bySg.gap > 0 ? "higher" : "lower"}` : "",
  ].filter(Boolean);
  const isNear = [byIndex, bySg].every((offset) => !offset || Math.abs(offset.inU) <= agreesWithinU);
  const where = parts.length === 0 ? "holds the reading" : parts.join(", ");
  return { sentence: isNear && parts.length > 0 ? `${where}: within 2u` : where, isNear, distanceU: Math.hypot(byIndex?.inU ?? 0, bySg?.inU ?? 0) };
}
