import type { ReportRow } from "./report-view.ts";
import type { Sheet } from "./sheet.ts";
import { widthOf, type FontName } from "./report-fonts.ts";
import { wrapText } from "./wrap-text.ts";

const size = 9.5;
const lineHeight = 13.2;

/** A label and its value, a rule below; measured parts in the typewriter face. */
export function drawRows(sheet: Sheet, rows: readonly ReportRow[], { x, width, labelWidth = 112 }: { x: number; width: number; labelWidth?: number }): void {
  for (const row of rows) {
    const lines = linesOf(sheet, row, width - labelWidth);
    sheet.ensure(Math.min(lines.length, 6) * lineHeight + 9);
    lines.forEach((line, index) => {
      sheet.ensure(lineHeight);
      sheet.y -= lineHeight;
      if (index === 0) sheet.line(row.label, { x, y: sheet.y + 1, size, ink: "soft" });
      let at = x + labelWidth;
      for (const piece of line) {
        sheet.line(piece.text, { x: at, y: sheet.y + 1, font: piece.font, size });
        at += widthOf(sheet.fonts, piece.text, piece.font, size);
      }
    });
    sheet.gap(4.5);
    sheet.rule({ x, width });
    sheet.gap(3.5);
  }
}

type Piece = { text: string; font: FontName };

function linesOf(sheet: Sheet, row: ReportRow, width: number): Piece[][] {
  const lines: Piece[][] = [[]];
  let used = 0;
  for (const part of row.parts) {
    const font: FontName = part.isMono ? "mono" : "sans";
    const space = used > 0 ? widthOf(sheet.fonts, "  ", font, size) : 0;
    const whole = widthOf(sheet.fonts, part.text, font, size);
    if (used + space + whole <= width) {
      lines.at(-1)!.push({ text: `${used > 0 ? "  " : ""}${part.text}`, font });
      used += space + whole;
      continue;
    }
    const wrapped = wrapText(sheet.fonts, part.text, { font, size }, width);
    if (used > 0) lines.push([]);
    wrapped.forEach((text, index) => {
      if (index > 0) lines.push([]);
      lines.at(-1)!.push({ text, font });
    });
    used = widthOf(sheet.fonts, wrapped.at(-1) ?? "", font, size);
  }
  return lines;
}
