import { rgb, type PDFPage } from "pdf-lib";
import QRCode from "qrcode";

/** A QR code as vector rectangles, one a run of dark modules; error correction M. */
export function drawQr(page: PDFPage, text: string, { x, y, size }: { x: number; y: number; size: number }): void {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: "M" });
  const step = size / modules.size;
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; ) {
      let end = column;
      while (end < modules.size && modules.get(row, end)) end++;
      if (end > column) {
        // A hair taller than a module, so that no renderer leaves a seam between rows.
        page.drawRectangle({ x: x + column * step, y: y + size - (row + 1) * step - 0.03, width: (end - column) * step, height: step + 0.06, color: rgb(0, 0, 0) });
      }
      column = Math.max(end, column + 1);
    }
  }
}
