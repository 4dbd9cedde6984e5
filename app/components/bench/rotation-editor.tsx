import { useDeferredValue, useEffect, useMemo, useState } from "react";
import { RotationPlot } from "#app/components/charts/rotation-plot.tsx";
import { Button } from "#app/components/ui/button.tsx";
import type { Light } from "#app/domain/reading.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { composeRotation } from "#app/features/readings/compose-rotation.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { readRotationRows } from "#app/features/readings/rotation-rows.ts";
import { edgeUncertainty } from "#app/features/readings/usual-uncertainty.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import type { RotationFit } from "#app/gemmology/rotation/rotation-fit.ts";
import { RotationDial } from "./rotation-dial.tsx";
import { RotationFindings } from "./rotation-findings.tsx";
import { addedRow, emptyFacet, rowsText, tablesOf, type FacetTable, type PositionRow } from "./rotation-table-state.ts";

type RotationEditorProps = { name: string; initial: string; light: Light; instrument: ReadingInstrument | null; quality: "good" | "fair" | "poor" | "noResult"; onReading: (reading: ComposedReading | null) => void };
type At = Readonly<{ facet: number; row: number }>;
const cells = ["angle", "first", "second", "polariser"] as const;
const cellNames = { angle: "Angle", first: "Lower edge", second: "Upper edge", polariser: "Polariser" } as const;
const mostFacets = 6;

/** The positions of a run in a table, the dial of the one that is read, and what all of them amount to so far. */
export default function RotationEditor({ name, initial, light, instrument, quality, onReading }: RotationEditorProps) {
  const [facets, setFacets] = useState<readonly FacetTable[]>(() => tablesOf(initial));
  const [at, setAt] = useState<At>({ facet: 0, row: 0 });
  const text = rowsText(facets);
  const settled = useDeferredValue(text);
  const { reading, fit, problem } = useMemo(() => fitted(settled, { light, quality, instrument }), [settled, light, quality, instrument]);
  useEffect(() => onReading(reading), [reading, onReading]);

  const facet = facets[at.facet] ?? facets[0]!;
  const write = (row: number, change: Partial<PositionRow>) =>
    setFacets((all) => all.map((one, index) => (index === at.facet ? { ...one, rows: one.rows.map((each, position) => (position === row ? { ...each, ...change } : each)) } : one)));

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
          <Button
            type="button"
            look="quiet"
            onClick={() => {
              setFacets([...facets, emptyFacet(facets.length === 1 ? "pavilion" : `facet ${facets.length + 1}`)]);
              setAt({ facet: facets.length, row: 0 });
            }}
          >
            Another facet
          </Button>
        ) : null}
      </div>
      <label className="grid max-w-48 gap-1 text-xs font-semibold text-ink-2">
        Facet
        <input value={facet.label} maxLength={40} onChange={(event) => setFacets((all) => all.map((one, index) => (index === at.facet ? { ...one, label: event.target.value } : one)))} className="control w-full px-3 py-1.5 text-sm font-normal text-ink" />
      </label>
      <div className="flex flex-wrap items-start gap-4">
        <table className="border-collapse text-sm">
          <caption className="sr-only">Positions on {facet.label}</caption>
          <thead>
            <tr>
              {cells.map((cell) => (
                <th key={cell} scope="col" className="pr-1 pb-1 text-left text-xs font-semibold whitespace-nowrap text-ink-2">
                  {cellNames[cell]}
                  {cell === "angle" || cell === "polariser" ? <span className="font-normal text-ink-3">, °</span> : null}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {facet.rows.map((row, index) => (
              <tr key={index} className={index === at.row ? "bg-tint/10" : undefined}>
                {cells.map((cell) => (
                  <td key={cell} className="py-0.5 pr-1">
                    <input
                      aria-label={`${cellNames[cell]}, position ${index + 1}`}
                      data-cell={cell}
                      inputMode="decimal"
                      autoComplete="off"
                      spellCheck={false}
                      maxLength={12}
                      value={row[cell]}
                      onFocus={() => setAt({ ...at, row: index })}
                      onChange={(event) => write(index, { [cell]: event.target.value })}
                      className={`control min-h-8 px-2 py-1 font-mono text-sm pointer-coarse:min-h-11 ${cell === "angle" || cell === "polariser" ? "w-16" : "w-20"}`}
                    />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
        <RotationDial angle={facet.rows[at.row]?.angle ?? "0"} onTurn={(angle) => write(at.row, { angle })} />
      </div>
      <div className="flex flex-wrap gap-2">
        <Button type="button" look="quiet" onClick={() => setFacets((all) => all.map((one, index) => (index === at.facet ? { ...one, rows: [...one.rows, addedRow(one.rows)] } : one)))}>
          Another position
        </Button>
        {facets.length > 1 ? (
          <Button
            type="button"
            look="quiet"
            onClick={() => {
              setFacets(facets.filter((_, index) => index !== at.facet));
              setAt({ facet: 0, row: 0 });
            }}
          >
            Leave out this facet
          </Button>
        ) : null}
      </div>
      {fit ? (
        <>
          <RotationPlot run={fit.run} fit={fit.fit} />
          <RotationFindings fit={fit.fit} />
        </>
      ) : (
        <p className="text-sm text-ink-3" aria-live="polite">
          {settled === "" ? "Turn the stone a full half turn; write what both edges show at each position. Curves begin at three." : problem}
        </p>
      )}
    </div>
  );
}

type Fitted = Readonly<{ reading: ComposedReading | null; fit: { run: ReturnType<typeof readRotationRows>["run"] & object; fit: RotationFit } | null; problem: string }>;

function fitted(rows: string, { light, quality, instrument }: { light: Light; quality: RotationEditorProps["quality"]; instrument: ReadingInstrument | null }): Fitted {
  const { run, problem } = readRotationRows(rows, edgeUncertainty({ instrument, light, quality: quality === "noResult" ? "good" : quality }));
  if (!run) return { reading: null, fit: null, problem: problem ?? "" };
  const { reading, problems } = composeRotation({ kind: "rotation", quality, light, rows }, instrument);
  return { reading: reading ?? null, fit: { run, fit: fitRotation(run) }, problem: problems?.rows?.[0] ?? "" };
}
