import { useQuery } from "@tanstack/react-query";
import { lazy, memo, Suspense, useDeferredValue, useMemo } from "react";
import type { MapSpecies } from "#app/components/charts/index-density-map.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import type { BenchRanking } from "#app/features/identification/bench-ranking.ts";
import type { NumberedReading } from "#app/features/identification/rank-readings.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { speciesBoxes } from "#app/features/species/species-boxes.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";
import { CompareCandidatesCard } from "./compare-candidates-card.tsx";
import { CandidatesCard } from "./candidates-card.tsx";

/** Charts come after the page works, as the species table does. */
const IndexDensityMap = lazy(async () => ({ default: (await import("#app/components/charts/index-density-map.tsx")).IndexDensityMap }));

export type LiveCandidatesProps = {
  /** As the server ranked what was saved; shown until the table is here, and without script. */
  saved: BenchRanking;
  readings: readonly NumberedReading[];
  /** The reading that is being typed; null while it is none. */
  typed: ComposedReading | null;
  /** Ids of two candidates that are set side by side. */
  compare: readonly string[];
  prior: "prevalence" | "even";
};

/** The candidates as digits are typed, before anything is saved: the server's own code, run here. */
export function LiveCandidates({ saved, readings, typed, compare, prior }: LiveCandidatesProps) {
  const { data: live } = useQuery({
    queryKey: ["species-table", saved.tableVersion],
    // The matcher comes with the table: without it there is nothing to match, and the page works before either is here.
    queryFn: async ({ signal }) => {
      const [response, { rankReadings }, { evidenceFromReadings }] = await Promise.all([
        fetch(`/species-table/${saved.tableVersion}.json`, { signal }),
        import("#app/features/identification/rank-readings.ts"),
        import("#app/features/readings/evidence-from-readings.ts"),
      ]);
      if (!response.ok) throw new Error(`species table: ${response.status}`);
      return { table: (await response.json()) as SpeciesTable, rankReadings, saysAnything: (reading: ComposedReading) => Object.keys(evidenceFromReadings([reading])).length > 0 };
    },
    staleTime: Infinity,
    gcTime: Infinity,
  });
  const latest = useDeferredValue(typed);
  const ranking = useMemo(() => {
    if (!live) return saved;
    return live.rankReadings(latest ? [...readings, { ...latest, sequence: null }] : readings, live.table, { compare, prior });
  }, [live, saved, readings, latest, compare, prior]);
  // Two hundred boxes may come a moment after the list.
  const mapped = useDeferredValue(ranking);
  return (
    <>
      <CandidatesCard ranking={ranking} prior={prior} isWithTyped={Boolean(live && latest && live.saysAnything(latest))} />
      <CompareCandidatesCard compared={ranking.compared} />
      {live && (mapped.index || mapped.density) ? <StandingMap table={live.table} ranking={mapped} /> : null}
    </>
  );
}

const StandingMap = memo(function StandingMap({ table, ranking }: { table: SpeciesTable; ranking: BenchRanking }) {
  const species = useMemo(() => mapSpecies(table, ranking), [table, ranking]);
  const { index, density } = ranking;
  return (
    <Card title="Index and density" note="every species in the table">
      <CardBody>
        <Suspense fallback={<div className="aspect-[16/11] max-w-2xl" />}>
          <IndexDensityMap species={species} reading={{ ri: index?.value, riU: index?.u, sg: density?.value, sgU: density?.u }} mostNames={3} />
        </Suspense>
      </CardBody>
    </Card>
  );
});

function mapSpecies(table: SpeciesTable, { candidates, ruledOut }: BenchRanking): MapSpecies[] {
  const shown = new Set(candidates.map(({ speciesId }) => speciesId));
  const out = new Set(ruledOut.map(({ speciesId }) => speciesId));
  return speciesBoxes(table).boxes.map(({ id, name, index, sg }) => ({ id, name, riLow: index[0], riHigh: index[1], sgLow: sg[0], sgHigh: sg[1], standing: shown.has(id) ? "candidate" : out.has(id) ? "contradicted" : "open" }));
}
