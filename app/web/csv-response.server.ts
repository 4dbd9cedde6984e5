import { Readable } from "node:stream";
import { stringify } from "csv-stringify";

/** A CSV that streams; a cell that a spreadsheet would run as a formula is escaped. */
export function csvResponse({ fileName, header, rows }: { fileName: string; header: readonly string[]; rows: AsyncIterable<readonly string[]> | Iterable<readonly string[]> }): Response {
  const csv = Readable.from(rows).pipe(stringify({ header: true, columns: [...header], escape_formulas: true, record_delimiter: "windows" }));
  return new Response(Readable.toWeb(csv) as ReadableStream, {
    headers: { "Content-Type": "text/csv; charset=utf-8", "Content-Disposition": `attachment; filename="${fileName}"`, "Cache-Control": "private, no-store" },
  });
}
