import { chapter, section } from "./draw-further-pages.ts";
import { drawRows } from "./draw-rows.ts";
import { drawSignatures, signaturesHeight } from "./draw-signatures.ts";
import type { ReportView, ValuationView } from "./report-view.ts";
import { fullWidth, inks, margin, type Sheet } from "./sheet.ts";
import { wrapAtMost, wrapText } from "./wrap-text.ts";

/** The opinion of value on pages of its own: the figure, what it means, what it rests on, and what the appraiser certifies. */
export function drawValuationPages(sheet: Sheet, view: ReportView, valuation: ValuationView): void {
  sheet.newPage();
  sheet.text("Opinion of value", { x: margin, width: fullWidth, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
  sheet.text(valuation.value, { x: margin, width: fullWidth, font: "serif", size: 24, leading: 1.2 });
  sheet.gap(2);
  sheet.text(valuation.valueType, { x: margin, width: fullWidth, size: 11 });
  sheet.gap(8);
  if (valuation.option) drawOption(sheet, valuation.option);
  drawRows(sheet, valuation.facts, { x: margin, width: fullWidth, labelWidth: 138 });
  sheet.gap(10);
  section(sheet, "Definition of the value", [valuation.valueDefinition, `Source: ${valuation.valueDefinitionSource}`]);
  drawComparables(sheet, valuation);
  section(sheet, "How the value follows", [valuation.reasoning].filter(Boolean));
  section(sheet, "Other approaches", [valuation.otherApproaches].filter(Boolean));
  section(sheet, "Limiting conditions", valuation.limitingConditions);
  const signatures = view.signatures.slice(-1);
  // The signature stands under what it signs, never alone on a page.
  section(sheet, "The appraiser certifies", valuation.certification, { keepWith: signaturesHeight(signatures) + 8 });
  drawSignatures(sheet, signatures);
}

/** Which kind of appraisal report it is; a restriction of its use is set so that nobody misses it. */
function drawOption(sheet: Sheet, { name, useRestriction }: NonNullable<ValuationView["option"]>): void {
  const lines = useRestriction ? wrapAtMost(6, useRestriction, { font: "sans", size: 9.5 }, fullWidth - 24) : [];
  const height = 22 + lines.length * 13;
  sheet.ensure(height + 8);
  sheet.page.drawRectangle({ x: margin, y: sheet.y - height, width: fullWidth, height, color: inks.strawGround });
  sheet.page.drawRectangle({ x: margin, y: sheet.y - height, width: 2.5, height, color: inks.straw });
  sheet.line(wrapAtMost(1, name, { font: "bold", size: 9.5 }, fullWidth - 24)[0]!, { x: margin + 12, y: sheet.y - 15, font: "bold", ink: "straw" });
  lines.forEach((text, index) => sheet.line(text, { x: margin + 12, y: sheet.y - 28 - index * 13, ink: "straw" }));
  sheet.y -= height + 8;
}

const size = 8.2;
const lineHeight = 11;
const columns = [
  { title: "Reference", x: 0, width: 112, font: "sans", isRight: false },
  { title: "Description and adjustment", x: 120, width: 172, font: "sans", isRight: false },
  { title: "Date", x: 300, width: 46, font: "sans", isRight: false },
  { title: "Price", x: 426, width: 78, font: "mono", isRight: true },
  { title: "Adjusted", x: fullWidth, width: 78, font: "mono", isRight: true },
] as const;

function drawComparables(sheet: Sheet, { comparables }: ValuationView): void {
  if (comparables.length === 0) return;
  chapter(sheet, "Comparables");
  drawTitles(sheet);
  for (const row of comparables) {
    const cells = [row.reference, `${row.description}${row.adjustment ? ` (${row.adjustment})` : ""}`, row.onDate, row.price, row.adjusted];
    const wrapped = cells.map((text, index) => wrapText(text, { font: columns[index]!.font, size }, columns[index]!.width));
    const count = Math.max(...wrapped.map(({ length }) => length));
    turnTo(sheet, Math.min(count, 12) * lineHeight + 8);
    sheet.gap(2);
    for (let line = 0; line < count; line++) {
      turnTo(sheet, lineHeight + 6);
      sheet.y -= lineHeight;
      wrapped.forEach((texts, index) => {
        const { x, font, isRight } = columns[index]!;
        const text = texts[line];
        if (text) sheet.line(text, { x: margin + x, y: sheet.y + 1, size, font, align: isRight ? "right" : "left" });
      });
    }
    sheet.gap(4);
    sheet.rule();
  }
  sheet.gap(12);
}

/** Turns the page where needed and repeats the column titles there. */
function turnTo(sheet: Sheet, height: number): void {
  const { page } = sheet;
  sheet.ensure(height);
  if (sheet.page !== page) drawTitles(sheet);
}

function drawTitles(sheet: Sheet): void {
  sheet.y -= lineHeight;
  for (const { title, x, isRight } of columns) sheet.line(title, { x: margin + x, y: sheet.y + 1, size: 8, ink: "soft", align: isRight ? "right" : "left" });
  sheet.gap(3);
  sheet.rule();
}
