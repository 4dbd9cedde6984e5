import type { ReportSignature } from "./report-view.ts";
import { fullWidth, margin, type Sheet } from "./sheet.ts";
import { wrapAtMost } from "./wrap-text.ts";

const gap = 26;
const mostInRow = 3;
const signRoom = 22;

/** Lines to sign on, two or three abreast, each with who, in what role, and when. */
export function drawSignatures(sheet: Sheet, signatures: readonly ReportSignature[]): void {
  for (const row of rowsOf(signatures)) {
    sheet.ensure(row.height);
    const top = sheet.y - signRoom;
    row.blocks.forEach(({ who, statement, onDate }, index) => {
      const x = margin + index * (row.width + gap);
      sheet.y = top;
      sheet.rule({ x, width: row.width, thickness: 0.9, ink: "ink" });
      let y = top - 2;
      for (const text of who) sheet.line(text, { x, y: (y -= 12), font: "bold", size: 9.2 });
      for (const text of [...statement, onDate]) sheet.line(text, { x, y: (y -= 12), size: 8.8, ink: "soft" });
    });
    sheet.y = top - (row.height - signRoom);
  }
}

export function signaturesHeight(signatures: readonly ReportSignature[]): number {
  return rowsOf(signatures).reduce((sum, { height }) => sum + height, 0);
}

function rowsOf(signatures: readonly ReportSignature[]) {
  const inRow = signatures.length === 3 ? mostInRow : 2;
  const width = (fullWidth - (inRow - 1) * gap) / inRow;
  const rows = [];
  for (let at = 0; at < signatures.length; at += inRow) {
    const blocks = signatures.slice(at, at + inRow).map(({ name, title, statement, onDate }) => ({
      who: wrapAtMost(2, [name, title].filter(Boolean).join(", "), { font: "bold", size: 9.2 }, width),
      statement: wrapAtMost(2, statement, { font: "sans", size: 8.8 }, width),
      onDate,
    }));
    const lines = Math.max(...blocks.map(({ who, statement }) => who.length + statement.length + 1));
    rows.push({ width, blocks, height: signRoom + 6 + lines * 12 });
  }
  return rows;
}
