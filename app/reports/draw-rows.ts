import { widthOf, type FontName } from "./report-fonts.ts";
import type { ReportRow } from "./report-view.ts";
import type { Sheet } from "./sheet.ts";
import { wrapText } from "./wrap-text.ts";

const size = 9.5;
const lineHeight = 13.2;

/** A label and its value, a rule below; measured parts in the typewriter face. */
export function drawRows(sheet: Sheet, rows: readonly ReportRow[], { x, width, labelWidth = 112 }: { x: number; width: number; labelWidth?: number }): void {
  for (const row of rows) {
    const labels = wrapText(row.label, { font: "sans", size }, labelWidth - 10);
    const values = linesOf(row, width - labelWidth);
    const count = Math.max(labels.length, values.length);
    sheet.ensure(Math.min(count, 6) * lineHeight + 9);
    for (let index = 0; index < count; index++) {
      sheet.ensure(lineHeight);
      sheet.y -= lineHeight;
      const label = labels[index];
      if (label) sheet.line(label, { x, y: sheet.y + 1, size, ink: "soft" });
      let at = x + labelWidth;
      for (const piece of values[index] ?? []) at = sheet.line(piece.text, { x: at, y: sheet.y + 1, font: piece.font, size });
    }
    sheet.gap(4.5);
    sheet.rule({ x, width });
    sheet.gap(3.5);
  }
}

type Piece = { text: string; font: FontName };

/** Parts follow one another on a line with a wide space between; one that does not fit begins a line of its own. */
function linesOf(row: ReportRow, width: number): Piece[][] {
  const lines: Piece[][] = [[]];
  let used = 0;
  for (const part of row.parts) {
    const font: FontName = part.isMono ? "mono" : "sans";
    const text = `${used > 0 ? "  " : ""}${part.text}`;
    const whole = part.text.includes("\n") ? Infinity : widthOf(text, font, size);
    if (used + whole <= width) {
      lines.at(-1)!.push({ text, font });
      used += whole;
      continue;
    }
    const wrapped = wrapText(part.text, { font, size }, width);
    if (used > 0) lines.push([]);
    wrapped.forEach((line, index) => {
      if (index > 0) lines.push([]);
      lines.at(-1)!.push({ text: line, font });
    });
    used = widthOf(wrapped.at(-1)!, font, size);
  }
  return lines;
}
