import { Button } from "#app/components/ui/button.tsx";
import { addedRow, type FacetTable, type PositionRow } from "./rotation-table-state.ts";

type RotationPositionsProps = { facet: FacetTable; atRow: number; onRow: (row: number) => void; onChange: (facet: FacetTable) => void; /** Null where it is the only one. */ onLeaveOut: (() => void) | null };

const cells = ["angle", "first", "second", "polariser"] as const;
const cellNames = { angle: "Angle", first: "Lower edge", second: "Upper edge", polariser: "Polariser" } as const;
const isAngle = (cell: (typeof cells)[number]) => cell === "angle" || cell === "polariser";

/** One facet's positions, a row each; Enter and a blank after digits go from edge to edge. */
export function RotationPositions({ facet, atRow, onRow, onChange, onLeaveOut }: RotationPositionsProps) {
  const write = (row: number, change: Partial<PositionRow>) => onChange({ ...facet, rows: facet.rows.map((each, position) => (position === row ? { ...each, ...change } : each)) });
  return (
    <div className="grid content-start justify-items-start gap-3">
      <label className="grid max-w-48 gap-1 text-xs font-semibold text-ink-2">
        Name of this facet
        <input value={facet.label} maxLength={40} onChange={(event) => onChange({ ...facet, label: event.target.value })} className="control w-full px-3 py-1.5 text-sm font-normal text-ink pointer-coarse:min-h-11" />
      </label>
      <table className="border-collapse text-sm">
        <caption className="sr-only">Positions on {facet.label}</caption>
        <thead>
          <tr>
            {cells.map((cell) => (
              <th key={cell} scope="col" className="pr-1 pb-1 text-left text-xs font-semibold whitespace-nowrap text-ink-2">
                {cellNames[cell]}
                {isAngle(cell) ? <span className="font-normal text-ink-3">, °</span> : null}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {facet.rows.map((row, index) => (
            <tr key={index} className={index === atRow ? "bg-tint/10" : undefined}>
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
                    onFocus={() => onRow(index)}
                    onChange={(event) => write(index, { [cell]: event.target.value })}
                    className={`control min-h-8 px-2 py-1 font-mono text-sm pointer-coarse:min-h-11 ${isAngle(cell) ? "w-16" : "w-20"}`}
                  />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <div className="flex flex-wrap gap-2">
        <Button type="button" look="quiet" onClick={() => onChange({ ...facet, rows: [...facet.rows, addedRow(facet.rows)] })}>
          Another position
        </Button>
        {onLeaveOut ? (
          <Button type="button" look="quiet" onClick={onLeaveOut}>
            Leave out this facet
          </Button>
        ) : null}
      </div>
    </div>
  );
}
