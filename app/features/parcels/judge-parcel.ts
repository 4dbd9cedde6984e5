import { parcelColumnNames, type ParcelRanking } from "#app/domain/parcel.ts";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import type { Ranking } from "#app/gemmology/ranking/ranking.ts";
import { robustOutliers } from "./robust-outliers.ts";
import type { ReadRow, RowFigures } from "./row-evidence.ts";

/** What is kept of a row's ranking to compare rows by. */
export type RankedRow = Readonly<{ candidates: ReadonlyArray<Readonly<{ speciesId: string; name: string; probability: number }>>; contradicted: ReadonlyMap<string, string> }>;
export type JudgedParcel = Readonly<{
  /** What most of the parcel is, by the sum of the rows' probabilities; null where no row says anything. */
  main: Readonly<{ speciesId: string; name: string; /** Rows whose likeliest species it is. */ rowCount: number }> | null;
  rankedCount: number;
  rows: readonly ParcelRanking[];
}>;

export const saysNothing = (evidence: Evidence): boolean => Object.keys(evidence).length === 0;

export function rankedRow({ candidates, contradicted }: Ranking): RankedRow {
  return { candidates: candidates.map(({ speciesId, name, probability }) => ({ speciesId, name, probability })), contradicted: new Map(contradicted.map(({ speciesId, because }) => [speciesId, because])) };
}

/** Below this the main species is as good as out of question for a row. */
const disagreesBelow = 0.05;
const columnsCompared = ["riLow", "riHigh", "riSpot", "sg", "birefringence"] as const satisfies ReadonlyArray<keyof RowFigures>;
const decimalsOf: Readonly<Record<(typeof columnsCompared)[number], number>> = { riLow: 4, riHigh: 4, riSpot: 3, sg: 3, birefringence: 4 };

/**
 * What the parcel mostly is, and which rows stand apart: those whose readings speak against its main species, and those
 * with a value far from the others'.
 *
 * @param ranked null where a row is not ranked (yet, or because it says nothing)
 */
export function judgeParcel(rows: readonly ReadRow[], ranked: ReadonlyArray<RankedRow | null>): JudgedParcel {
  const sums = new Map<string, { name: string; sum: number }>();
  for (const row of ranked) for (const { speciesId, name, probability } of row?.candidates ?? []) sums.set(speciesId, { name, sum: (sums.get(speciesId)?.sum ?? 0) + probability });
  const [first] = [...sums].sort(([a, { sum: one }], [b, { sum: other }]) => other - one || (a < b ? -1 : 1));
  const mainId = first?.[0];
  const apart = columnsCompared.flatMap((column) => {
    const u = rows.reduce((most, { figures }) => Math.max(most, figures[column]?.u ?? 0), 0);
    return [{ column, outliers: robustOutliers(rows.map(({ figures }) => figures[column]?.value), u) }];
  });
  const judged = ranked.map((row, at): ParcelRanking => {
    const main = row?.candidates.find(({ speciesId }) => speciesId === mainId)?.probability ?? 0;
    const odd: string[] = [];
    const likeliest = row?.candidates[0];
    if (row && mainId && main < disagreesBelow && likeliest?.speciesId !== mainId) {
      odd.push(`${first![1].name} does not fit${row.contradicted.has(mainId) ? ` (${row.contradicted.get(mainId)})` : ""}${likeliest ? `; ${likeliest.name} does` : ""}.`);
    }
    for (const { column, outliers } of apart) {
      const outlier = outliers[at];
      if (outlier) odd.push(`${parcelColumnNames[column].split(",")[0]} ${rows[at]!.figures[column]!.value.toFixed(decimalsOf[column])} stands far from the parcel’s median ${outlier.median.toFixed(decimalsOf[column])} (modified z ${outlier.z < 0 ? "−" : "+"}${Math.abs(outlier.z).toFixed(1)}).`);
    }
    return { top: (row?.candidates ?? []).slice(0, 3), main, odd };
  });
  return {
    main: first ? { speciesId: mainId!, name: first[1].name, rowCount: ranked.filter((row) => row?.candidates[0]?.speciesId === mainId).length } : null,
    rankedCount: ranked.filter((row) => row !== null).length,
    rows: judged,
  };
}
