import { startTransition, useEffect, useState } from "react";
import { rankedRow, saysNothing, type RankedRow } from "#app/features/parcels/judge-parcel.ts";
import type { ReadRow } from "#app/features/parcels/row-evidence.ts";
import type { Ranking } from "#app/gemmology/ranking/ranking.ts";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";

type Matcher = (evidence: Evidence) => Ranking;
/** Milliseconds of ranking before the page is let answer to the hand. */
const sliceMs = 12;

const known = new Map<string, RankedRow>();
let matcher: { version: string; loading: Promise<Matcher> } | undefined;

/** The species table and the matcher come when the first row is there, and once. */
function loadMatcher(version: string): Promise<Matcher> {
  if (matcher?.version !== version) {
    known.clear();
    const loading = Promise.all([fetch(`/species-table/${version}.json`), import("#app/gemmology/ranking/rank-species.ts")]).then(async ([response, { rankSpecies }]): Promise<Matcher> => {
      if (!response.ok) throw new Error(`species table: ${response.status}`);
      const table = (await response.json()) as SpeciesTable;
      return (evidence) => rankSpecies(evidence, table);
    });
    matcher = { version, loading };
    loading.catch(() => (matcher = undefined));
  }
  return matcher!.loading;
}

/**
 * Rows ranked in the browser by the server's own matcher, some milliseconds at a time; a row that says the same as one
 * ranked before is not ranked again. A row without a ranking yet is undefined, one that says nothing null.
 */
export function useRankedRows(rows: readonly ReadRow[], tableVersion: string): { ranked: ReadonlyArray<RankedRow | null | undefined>; isBusy: boolean } {
  const [finished, setFinished] = useState(0);
  const keys = rows.map(({ evidence }) => (saysNothing(evidence) ? null : JSON.stringify(evidence)));
  const waiting = [...new Set(keys.flatMap((key) => (key !== null && !known.has(key) ? [key] : [])))];
  const signature = waiting.join("\n");
  useEffect(() => {
    let isCurrent = true;
    const rest = signature === "" ? [] : signature.split("\n");
    const work = async () => {
      if (rest.length === 0) return;
      const match = await loadMatcher(tableVersion);
      let sliceEndsAt = performance.now() + sliceMs;
      let shownAt = performance.now();
      for (const key of rest) {
        if (!isCurrent) return;
        known.set(key, rankedRow(match(JSON.parse(key) as Evidence)));
        if (performance.now() < sliceEndsAt) continue;
        if (performance.now() - shownAt > 300) {
          shownAt = performance.now();
          startTransition(() => setFinished((times) => times + 1));
          return;
        }
        await new Promise((resolve) => setTimeout(resolve));
        sliceEndsAt = performance.now() + sliceMs;
      }
      if (isCurrent) startTransition(() => setFinished((times) => times + 1));
    };
    // The server ranks all the same when it saves.
    const timer = setTimeout(() => void work().catch(() => undefined), 60);
    return () => {
      isCurrent = false;
      clearTimeout(timer);
    };
  }, [signature, tableVersion, finished]);
  return { ranked: keys.map((key) => (key === null ? null : known.get(key))), isBusy: waiting.length > 0 };
}
