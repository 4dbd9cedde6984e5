import { memo } from "react";
import { Chip } from "#app/components/ui/chip.tsx";
import { HeaderCell } from "#app/components/ui/table.tsx";
import { mostCellLength, parcelColumnNames, parcelColumns, type ParcelColumn, type ParcelRanking } from "#app/domain/parcel.ts";

type HeadProps = { columns: ReadonlyArray<ParcelColumn | null>; problems: Readonly<Record<number, string>>; onColumn: (at: number, column: ParcelColumn | null) => void };

/** What each column holds: recognised, and anybody's to change. */
export function ParcelHead({ columns, problems, onColumn }: HeadProps) {
  return (
    <thead>
      <tr>
        <HeaderCell>Row</HeaderCell>
        {columns.map((column, at) => (
          <th key={at} scope="col" className="px-1 py-1 align-top font-normal">
            <select
              name="column"
              defaultValue={column ?? ""}
              onChange={(event) => onColumn(at, parcelColumns.find((known) => known === event.target.value) ?? null)}
              aria-label={`Column ${at + 1} holds`}
              aria-invalid={problems[at] ? true : undefined}
              aria-describedby={problems[at] ? `column-${at}-error` : undefined}
              className="control min-h-8 w-full min-w-24 max-w-44 truncate px-1.5 py-1 text-xs font-semibold pointer-coarse:min-h-11"
            >
              <option value="">Leave out</option>
              {parcelColumns.map((value) => (
                <option key={value} value={value}>
                  {parcelColumnNames[value]}
                </option>
              ))}
            </select>
            {problems[at] ? (
              <span id={`column-${at}-error`} className="mt-1 block text-left text-xs font-medium text-red">
                {problems[at]}
              </span>
            ) : null}
          </th>
        ))}
        <HeaderCell>Ranks as</HeaderCell>
      </tr>
    </thead>
  );
}

type RowProps = {
  /** Counted from 0. */
  at: number;
  columns: ReadonlyArray<ParcelColumn | null>;
  cells: readonly string[];
  /** The longest text of each column, characters. */
  widths: readonly number[];
  /** A sentence a column. */
  problems: Readonly<Partial<Record<number, string>>>;
  /** Undefined while it is not ranked yet. */
  ranking: ParcelRanking | undefined;
};

const widthLook = (characters: number) => (characters <= 6 ? "min-w-16" : characters <= 10 ? "min-w-24" : characters <= 18 ? "min-w-36" : "min-w-52");

/** A row in its inputs, each keeping what was typed. Drawn anew only when something in it changed. */
export const ParcelRow = memo(
  function ParcelRow({ at, columns, cells, widths, problems, ranking }: RowProps) {
    return (
      <tr className={ranking?.odd.length ? "bg-straw-bg/60" : ""}>
        <th scope="row" className="border-t border-rule py-1.5 pr-2 pl-4.5 text-right align-top font-mono text-xs font-normal text-ink-3">
          {at + 1}
        </th>
        {columns.map((column, index) => (
          <td key={index} className="border-t border-rule px-1 py-1 align-top">
            <input
              id={`cell-${at}-${index}`}
              name="cell"
              data-row={at}
              data-column={index}
              type="text"
              defaultValue={cells[index] ?? ""}
              maxLength={mostCellLength}
              autoComplete="off"
              spellCheck={false}
              aria-label={`Row ${at + 1}, ${column ? parcelColumnNames[column] : `column ${index + 1}`}`}
              aria-invalid={problems[index] ? true : undefined}
              aria-describedby={problems[index] ? `cell-${at}-${index}-error` : undefined}
              className={`control min-h-8 w-full ${widthLook(widths[index] ?? 0)} px-1.5 py-0.5 font-mono text-sm pointer-coarse:min-h-11 ${column === null ? "opacity-60" : ""}`}
            />
            {problems[index] ? (
              <span id={`cell-${at}-${index}-error`} className="mt-0.5 block max-w-44 text-xs font-medium text-red">
                {problems[index]}
              </span>
            ) : null}
          </td>
        ))}
        <td className="min-w-48 border-t border-rule py-1.5 pr-4.5 pl-2 align-top text-sm">
          <RanksAs ranking={ranking} />
        </td>
      </tr>
    );
  },
  (before, after) => before.at === after.at && before.cells === after.cells && before.columns === after.columns && before.widths === after.widths && JSON.stringify([before.problems, before.ranking]) === JSON.stringify([after.problems, after.ranking]),
);

/** The likeliest species of a row, and why the row stands apart. */
export function RanksAs({ ranking }: { ranking: ParcelRanking | undefined }) {
  if (!ranking) return <span className="text-ink-3">…</span>;
  const [first, second] = ranking.top;
  return (
    <>
      {first ? (
        <span>
          {first.name} <span className="font-mono text-ink-3">{percent(first.probability)}</span>
          {second && second.probability > 0.05 ? (
            <span className="block text-xs text-ink-3">
              {second.name} {percent(second.probability)}
            </span>
          ) : null}
        </span>
      ) : (
        <span className="text-ink-3">nothing to rank</span>
      )}
      {ranking.odd.length > 0 ? (
        <span className="mt-1 block">
          <Chip tone="straw">stands apart</Chip>
          {ranking.odd.map((why) => (
            <span key={why} className="mt-0.5 block text-xs text-straw">
              {why}
            </span>
          ))}
        </span>
      ) : null}
    </>
  );
}

const percent = (probability: number) => (probability >= 0.995 ? "> 99 %" : `${Math.round(probability * 100)} %`);
