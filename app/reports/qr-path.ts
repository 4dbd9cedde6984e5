import QRCode from "qrcode";

/** A QR code as one SVG path in a square of `size` units, one unit a module; for labels and receipts. */
export function qrPath(text: string): { size: number; path: string } {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: "M" });
  let path = "";
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; column++) {
      if (!modules.get(row, column)) continue;
      let end = column;
      while (end < modules.size && modules.get(row, end)) end++;
      path += `M${column} ${row}h${end - column}v1h-${end - column}z`;
      column = end;
    }
  }
  return { size: modules.size, path };
}
