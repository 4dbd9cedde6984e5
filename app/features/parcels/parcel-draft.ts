import { parseDecimal } from "#app/domain/decimal.ts";
import { mostCellLength, mostParcelColumns, mostParcelRows, mostParcelText, parcelColumns, type ParcelColumn } from "#app/domain/parcel.ts";
import { readColumns } from "./read-columns.ts";
import { splitTable } from "./split-table.ts";

/** A parcel's table as it stands in its form, every text as it was typed. */
export type ParcelDraft = Readonly<{
  requestId: string;
  name: string;
  /** Number of the item it was handed over in; empty where that is not said. */
  itemNumber: string;
  waterTempC: string;
  columns: ReadonlyArray<ParcelColumn | null>;
  rows: readonly string[][];
}>;

/** A pasted table with its columns recognised; the heading is no row. */
export function readPasted(text: string): Pick<ParcelDraft, "columns" | "rows"> & { notes: readonly string[] } {
  const { rows, notes } = splitTable(text.slice(0, mostParcelText));
  const { columns, hasHeader } = readColumns(rows);
  return { columns, rows: hasHeader ? rows.slice(1) : rows.slice(0, mostParcelRows), notes };
}

// Typed by nobody; a spreadsheet's line break within a cell among them.
const controls = /[\u0000-\u001f\u007f\u2028\u2029]/g;

/** Reads the form, which sends the table as its columns and its cells row by row. */
export function parcelDraftFromForm(form: { get: (name: string) => unknown; getAll: (name: string) => unknown[] }): ParcelDraft {
  const text = (name: string, most: number) => {
    const value = form.get(name);
    return typeof value === "string" ? value.slice(0, most) : "";
  };
  const columns = form.getAll("column").slice(0, mostParcelColumns).map((value) => parcelColumns.find((column) => column === value) ?? null);
  const cells = form.getAll("cell").map((value) => (typeof value === "string" ? value.slice(0, mostCellLength * 2).replace(controls, " ") : ""));
  const rowCount = columns.length === 0 ? 0 : Math.min(mostParcelRows, Math.floor(cells.length / columns.length));
  const rows = Array.from({ length: rowCount }, (_, at) => cells.slice(at * columns.length, (at + 1) * columns.length));
  return { requestId: text("requestId", 40), name: text("name", 400), itemNumber: text("itemNumber", 40).trim(), waterTempC: text("waterTempC", 24), columns, rows: rows.filter((row) => row.some((cell) => cell.trim() !== "")) };
}

/** What is wrong with the table, each at its place; nothing where it can be saved. */
export type ParcelProblems = Readonly<{
  fields: Readonly<Partial<Record<"name" | "itemNumber" | "waterTempC" | "table", string>>>;
  /** By the column's place. */
  columns: Readonly<Record<number, string>>;
  /** By "row,column", counted from 0. */
  cells: Readonly<Record<string, string>>;
}>;

export const noProblems: ParcelProblems = { fields: {}, columns: {}, cells: {} };

export const hasProblems = ({ fields, columns, cells }: ParcelProblems): boolean => [fields, columns, cells].some((each) => Object.keys(each).length > 0);

/** The water's temperature as a number; null where none was written or it is none. */
export function waterTempOf(typed: string): number | null {
  const value = parseDecimal(typed);
  return value !== undefined && value >= 0 && value <= 40 ? value : null;
}
