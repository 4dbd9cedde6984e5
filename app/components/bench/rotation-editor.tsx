import { useDeferredValue, useEffect, useMemo, useState } from "react";
import { RotationPlot } from "#app/components/charts/rotation-plot.tsx";
import { Button } from "#app/components/ui/button.tsx";
import type { Light, ReadingQuality } from "#app/domain/reading.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { composeRotation, correctedRun } from "#app/features/readings/compose-rotation.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { readRotationRows } from "#app/features/readings/rotation-rows.ts";
import { edgeUncertainty } from "#app/features/readings/usual-uncertainty.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import type { RotationFit } from "#app/gemmology/rotation/rotation-fit.ts";
import type { RotationRun } from "#app/gemmology/rotation/rotation-run.ts";
import { RotationDial } from "./rotation-dial.tsx";
import { RotationFindings } from "./rotation-findings.tsx";
import { RotationPositions } from "./rotation-positions.tsx";
import { emptyFacet, rowsText, tablesOf, type FacetTable } from "./rotation-table-state.ts";

type RotationEditorProps = { name: string; initial: string; light: Light; instrument: ReadingInstrument | null; quality: ReadingQuality; onReading: (reading: ComposedReading | null) => void };
const mostFacets = 6;

/** The positions of a run in a table, the dial of the one that is read, and what all of them amount to so far. */
export default function RotationEditor({ name, initial, light, instrument, quality, onReading }: RotationEditorProps) {
  const [facets, setFacets] = useState<readonly FacetTable[]>(() => tablesOf(initial));
  const [at, setAt] = useState({ facet: 0, row: 0 });
  const text = rowsText(facets);
  const settled = useDeferredValue(text);
  const { reading, run, fit, problem } = useMemo(() => fitted(settled, { light, quality, instrument }), [settled, light, quality, instrument]);
  useEffect(() => onReading(reading), [reading, onReading]);

  const facet = facets[at.facet] ?? facets[0]!;
  const change = (changed: FacetTable) => setFacets((all) => all.map((one, index) => (index === at.facet ? changed : one)));
  const leaveOut = () => {
    setFacets(facets.filter((_, index) => index !== at.facet));
    setAt({ facet: 0, row: 0 });
  };
  const add = () => {
    setFacets([...facets, emptyFacet(facets.length === 1 ? "pavilion" : `facet ${facets.length + 1}`)]);
    setAt({ facet: facets.length, row: 0 });
  };
  return (
    <div className="grid gap-3">
      <input type="hidden" name={name} value={text} />
      <div role="group" aria-label="Facets" className="flex flex-wrap items-center gap-1.5">
        {facets.map(({ label }, index) => (
          <button
            key={index}
            type="button"
            aria-pressed={index === at.facet}
            onClick={() => setAt({ facet: index, row: 0 })}
            className={`min-h-8 rounded-md border px-2.5 text-sm font-medium pointer-coarse:min-h-11 ${index === at.facet ? "border-ink bg-ink text-on-ink" : "border-rule-2 bg-paper text-ink-2"}`}
          >
            {label || `Facet ${index + 1}`}
          </button>
        ))}
        {facets.length < mostFacets ? (
          <Button type="button" look="quiet" onClick={add}>
            Another facet
          </Button>
        ) : null}
      </div>
      <div className="grid gap-x-6 gap-y-3 xl:grid-cols-[auto_minmax(0,1fr)]">
        <RotationPositions facet={facet} atRow={at.row} onRow={(row) => setAt({ ...at, row })} onChange={change} onLeaveOut={facets.length > 1 ? leaveOut : null} />
        <div className="grid content-start gap-3">
          <RotationDial
            angle={facet.rows[at.row]?.angle ?? "0"}
            onTurn={(angle) => change({ ...facet, rows: facet.rows.map((row, index) => (index === at.row ? { ...row, angle } : row)) })}
          />
          {run && fit ? (
            <>
              <RotationPlot run={run} fit={fit} />
              <RotationFindings fit={fit} />
            </>
          ) : null}
          {problem || settled === "" ? (
            <p className="text-sm text-ink-3" aria-live="polite">
              {settled === "" ? "Turn the stone a full half turn; write what both edges show at each position. Curves begin at three." : problem}
            </p>
          ) : null}
        </div>
      </div>
    </div>
  );
}

type Fitted = Readonly<{ reading: ComposedReading | null; run: RotationRun | null; fit: RotationFit | null; problem: string }>;

function fitted(rows: string, { light, quality, instrument }: { light: Light; quality: ReadingQuality; instrument: ReadingInstrument | null }): Fitted {
  const { run, problem } = readRotationRows(rows, edgeUncertainty({ instrument, light, quality: quality === "noResult" ? "good" : quality }));
  if (!run) return { reading: null, run: null, fit: null, problem: problem ?? "" };
  const shown = correctedRun(run, instrument);
  const { reading, problems } = composeRotation({ kind: "rotation", quality, light, rows }, instrument);
  return { reading: reading ?? null, run: shown, fit: fitRotation(shown), problem: problems?.rows?.[0] ?? "" };
}
