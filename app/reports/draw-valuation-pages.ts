import { heading, drawSignatures } from "./draw-first-page.ts";
import { paragraph, section } from "./draw-further-pages.ts";
import { drawRows } from "./draw-rows.ts";
import type { ReportView, ValuationView } from "./report-view.ts";
import { margin, pageWidth, type Sheet } from "./sheet.ts";
import { wrapText } from "./wrap-text.ts";

const width = pageWidth - 2 * margin;

/** The opinion of value on pages of its own: the figure, what it means, what it rests on, and what the appraiser certifies. */
export function drawValuationPages(sheet: Sheet, view: ReportView, valuation: ValuationView): void {
  sheet.newPage();
  sheet.text("Opinion of value", { x: margin, width, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
  sheet.text(valuation.value, { x: margin, width, font: "serif", size: 24, leading: 1.2 });
  sheet.text(valuation.valueType, { x: margin, width, size: 11 });
  sheet.gap(10);
  drawRows(sheet, valuation.facts, { x: margin, width, labelWidth: 140 });
  sheet.gap(8);
  section(sheet, "Definition of the value", [valuation.valueDefinition, `Source: ${valuation.valueDefinitionSource}`]);
  drawComparables(sheet, valuation);
  section(sheet, "How the comparables lead to the value", [valuation.reasoning]);
  if (valuation.otherApproaches) section(sheet, "Other approaches", [valuation.otherApproaches]);
  section(sheet, "Limiting conditions", valuation.limitingConditions);
  heading(sheet, "The appraiser certifies", margin, width);
  for (const point of valuation.certification) paragraph(sheet, `– ${point}`);
  sheet.gap(8);
  drawSignatures(sheet, { ...view, signatures: view.signatures.slice(-1) });
}

const columns = [
  { title: "Reference", x: 0, width: 128 },
  { title: "Description", x: 134, width: 148 },
  { title: "Date", x: 288, width: 58 },
  { title: "Price", x: 416, width: 66, isRight: true },
  { title: "Adjusted", x: 508, width: 86, isRight: true },
] as const;

function drawComparables(sheet: Sheet, valuation: ValuationView): void {
  heading(sheet, "Comparables", margin, width);
  sheet.y -= 11;
  for (const column of columns) sheet.line(column.title, { x: margin + column.x, y: sheet.y, size: 8, ink: "faint", align: "isRight" in column ? "right" : "left" });
  sheet.gap(5);
  sheet.rule();
  for (const row of valuation.comparables) {
    const cells = [row.reference, `${row.description}${row.adjustment ? ` (${row.adjustment})` : ""}`, row.onDate, row.price, row.adjusted];
    const wrapped = cells.map((text, index) => wrapText(sheet.fonts, text, { font: index > 2 ? "mono" : "sans", size: 8.2 }, columns[index]!.width));
    const lines = Math.max(...wrapped.map(({ length }) => length));
    sheet.ensure(Math.min(lines, 20) * 11 + 8);
    const top = sheet.y;
    wrapped.forEach((texts, index) => {
      const column = columns[index]!;
      texts.slice(0, 40).forEach((text, line) =>
        sheet.line(text, { x: margin + column.x, y: top - 12 - line * 11, size: 8.2, font: index > 2 ? "mono" : "sans", align: "isRight" in column ? "right" : "left" }),
      );
    });
    sheet.y = top - Math.min(lines, 40) * 11 - 6;
    sheet.rule();
  }
  sheet.gap(10);
}
