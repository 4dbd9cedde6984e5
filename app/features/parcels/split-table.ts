import { mostCellLength, mostParcelColumns, mostParcelRows } from "#app/domain/parcel.ts";

export type SplitTable = Readonly<{ delimiter: "\t" | ";" | ","; rows: readonly string[][]; /** What was left out, in a sentence each. */ notes: readonly string[] }>;

/**
 * Cells of a table as a spreadsheet puts it on the clipboard or writes it as CSV: separated by tabs, semicolons or
 * commas, quoted where they hold one (RFC 4180). Where there are tabs, commas are decimal marks; so they are between
 * semicolons. Every row comes out as long as the longest.
 */
export function splitTable(text: string): SplitTable {
  const delimiter = delimiterOf(text);
  const notes: string[] = [];
  let rows = parse(text, delimiter)
    .map((row) => row.map((cell) => cell.replace(/[\s\u00a0]+/g, " ").trim()))
    .filter((row) => row.some((cell) => cell !== ""));
  const longest = rows.reduce((most, row) => Math.max(most, row.findLastIndex((cell) => cell !== "") + 1), 0);
  const width = Math.min(longest, mostParcelColumns);
  if (longest > width) notes.push(`Only the first ${mostParcelColumns} of ${longest} columns are taken.`);
  // One more, for the names of the columns.
  if (rows.length > mostParcelRows + 1) {
    notes.push(`Only the first ${mostParcelRows} of ${rows.length} rows are taken: divide the parcel.`);
    rows = rows.slice(0, mostParcelRows + 1);
  }
  return { delimiter, rows: rows.map((row) => Array.from({ length: width }, (_, at) => (row[at] ?? "").slice(0, mostCellLength * 2))), notes };
}

function delimiterOf(text: string): SplitTable["delimiter"] {
  const bare = text.replace(/"(?:[^"]|"")*"/g, "");
  if (bare.includes("\t")) return "\t";
  return bare.includes(";") ? ";" : ",";
}

function parse(text: string, delimiter: string): string[][] {
  const rows: string[][] = [[]];
  let cell = "";
  let isQuoted = false;
  for (let at = 0; at < text.length; at++) {
    const character = text[at]!;
    if (isQuoted) {
      if (character !== '"') cell += character;
      else if (text[at + 1] === '"') {
        cell += '"';
        at++;
      } else isQuoted = false;
    } else if (character === '"' && cell.trim() === "") {
      cell = "";
      isQuoted = true;
    } else if (character === delimiter) {
      rows.at(-1)!.push(cell);
      cell = "";
    } else if (character === "\n" || character === "\r") {
      if (character === "\r" && text[at + 1] === "\n") at++;
      rows.at(-1)!.push(cell);
      cell = "";
      rows.push([]);
    } else cell += character;
  }
  rows.at(-1)!.push(cell);
  return rows;
}
