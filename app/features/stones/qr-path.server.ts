import QRCode from "qrcode";

/** A QR code as one SVG path: sharp at any size, and its modules are squares of one unit. */
export function qrPath(text: string): { sizeModules: number; path: string } {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: "M" });
  const runs: string[] = [];
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; column++) {
      if (!modules.get(row, column)) continue;
      let end = column;
      while (end < modules.size && modules.get(row, end)) end++;
      runs.push(`M${column} ${row}h${end - column}v1h-${end - column}z`);
      column = end;
    }
  }
  return { sizeModules: modules.size, path: runs.join("") };
}
