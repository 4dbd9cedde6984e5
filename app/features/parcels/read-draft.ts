import { parcelColumnNames } from "#app/domain/parcel.ts";
import { waterTempOf, type ParcelDraft, type ParcelProblems } from "./parcel-draft.ts";
import { rowEvidence, type ReadRow } from "./row-evidence.ts";

/** The rows of a table as the ranking takes them, and what is wrong, each at its place. The browser runs it as cells are typed, the server before it saves. */
export function readDraft({ name, waterTempC, columns, rows }: ParcelDraft, readRow: typeof rowEvidence = rowEvidence): { rows: ReadRow[]; problems: ParcelProblems } {
  const temp = waterTempOf(waterTempC);
  const read = rows.map((row) => readRow(row, { columns, waterTempC: temp }));
  const twice = columns.flatMap((column, at) => (column !== null && columns.indexOf(column) !== at ? [[at, `${parcelColumnNames[column]} is chosen for another column already.`] as const] : []));
  return {
    rows: read,
    problems: {
      fields: {
        ...(name.trim() === "" ? { name: "Name the parcel, so that it is found again." } : name.trim().length > 120 ? { name: "At most 120 characters." } : {}),
        ...(waterTempC.trim() !== "" && temp === null ? { waterTempC: "Write the temperature in degrees Celsius, between 0 and 40." } : {}),
        ...(rows.length === 0 ? { table: "Paste a table with a row for each stone." } : columns.every((column) => column === null) ? { table: "Say of at least one column what it holds." } : {}),
      },
      columns: Object.fromEntries(twice),
      cells: Object.fromEntries(read.flatMap(({ problems }, row) => Object.entries(problems).map(([column, message]) => [`${row},${column}`, message!]))),
    },
  };
}
