import { concatTransformationMatrix, fill, popGraphicsState, pushGraphicsState, rectangle, setFillingGrayscaleColor, type PDFPage } from "pdf-lib";
import { qrRuns } from "./qr-path.ts";

/** A QR code as one vector path, filled at once: sharp at any size, and no seams between its modules. */
export function drawQr(page: PDFPage, text: string, { x, y, size }: { x: number; y: number; size: number }): void {
  const { size: modules, runs } = qrRuns(text);
  const step = size / modules;
  page.pushOperators(
    pushGraphicsState(),
    setFillingGrayscaleColor(0),
    // One unit a module, rows downwards from the top edge.
    concatTransformationMatrix(step, 0, 0, -step, x, y + size),
    // A hair taller than a module, so that no renderer leaves a seam between rows.
    ...runs.map(({ row, column, length }) => rectangle(column, row, length, 1.02)),
    fill(),
    popGraphicsState(),
  );
}
