import QRCode from "qrcode";

export type QrRun = Readonly<{ row: number; column: number; length: number }>;

/** A QR code as runs of dark modules, a row at a time; error correction M. */
export function qrRuns(text: string): { size: number; runs: QrRun[] } {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: "M" });
  const runs: QrRun[] = [];
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; column++) {
      if (!modules.get(row, column)) continue;
      let end = column;
      while (end < modules.size && modules.get(row, end)) end++;
      runs.push({ row, column, length: end - column });
      column = end;
    }
  }
  return { size: modules.size, runs };
}

/** A QR code as one SVG path in a square of `size` units, one unit a module; for labels and receipts. Leave four units of white around it. */
export function qrPath(text: string): { size: number; path: string } {
  const { size, runs } = qrRuns(text);
  return { size, path: runs.map(({ row, column, length }) => `M${column} ${row}h${length}v1h-${length}z`).join("") };
}
