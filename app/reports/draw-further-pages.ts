import { reportTemplateVersion, type ReportView } from "./report-view.ts";
import { fullWidth, margin, type Sheet } from "./sheet.ts";
import { wrapText } from "./wrap-text.ts";

const labelWidth = 138;
const textX = margin + labelWidth;
const textWidth = fullWidth - labelWidth;
const size = 9.2;
const leading = 1.4;

/** What the conclusion rests on and how far it reaches: treatments, evidence, alternatives, limits, methods, cautions. */
export function drawFurtherPages(sheet: Sheet, view: ReportView): void {
  sheet.newPage();
  const { treatments } = view;
  chapter(sheet, "Treatment");
  section(sheet, "Found", orElse(treatments.found, "Nothing was found by the methods used."));
  section(sheet, "Looked for and not found", orElse(treatments.notFound, "No treatment was excluded."));
  section(sheet, "Not determinable with the methods used", orElse(treatments.notDeterminable, "None is listed."));
  section(sheet, "Stated by the client, not verified", treatments.stated);
  remark(sheet, "The absence of a remark does not mean that a stone is untreated. The statements hold for the stone as it was examined on the dates given; a stone can be treated afterwards.");

  chapter(sheet, "What the conclusion rests on");
  section(sheet, "Identity", present(view.evidence));
  section(sheet, "Natural, synthetic or other nature", present(view.natureEvidence));
  section(sheet, "Alternatives considered and rejected", view.rejected.map(({ name, because }) => `${name}: ${because}`));
  section(sheet, "Instruments and methods", view.instruments);
  section(sheet, "Limits", view.limits);

  chapter(sheet, "The item, and what others say of it");
  section(sheet, "As received", present(view.asReceived));
  section(sheet, "Stated by the client, not verified", present(view.clientStatements));
  section(sheet, "Stated by other laboratories, not taken over", (view.externalStatements ?? []).map(({ issuer, number, onDate, statement }) => `${issuer}, report ${number} of ${onDate}, as stated there: “${statement}”`));
  if (view.amendment) {
    section(sheet, "Amendment", [`This report replaces ${view.amendment.supersedesNumber}.`, ...(view.amendment.reason ? [`What changed, and why: ${view.amendment.reason}`] : [])]);
  }
  section(sheet, "Care", view.cautions);
  section(sheet, "How to read this report", [
    "Opinions are those of the signatories; results relate only to the stone examined, as received. This report must not be reproduced except in full.",
    "A valid code in the register proves the document, not the stone: compare the stone with the photograph, weight and measurements.",
    `Species table ${view.versions.speciesTable}, ranking model ${view.versions.rankingModel}, layout ${reportTemplateVersion}. Dates are in the time zone ${view.timeZone}.`,
  ]);
}

/** A title in the serif face over sections that belong together. */
export function chapter(sheet: Sheet, title: string): void {
  // With room for the first lines of what follows: no title stands alone at a page's foot.
  sheet.ensure(78);
  sheet.gap(8);
  sheet.text(title, { x: margin, width: fullWidth, font: "serif", size: 14, leading: 1.3 });
  sheet.gap(6);
}

/**
 * A label at the left, its paragraphs at the right, a hairline above. Nothing to say: nothing printed. With `keepWith`
 * the section stays on one page with so much of what follows, as long as a page can hold both.
 */
export function section(sheet: Sheet, title: string, paragraphs: readonly string[], { keepWith = 0 } = {}): void {
  if (paragraphs.length === 0) return;
  if (keepWith > 0) {
    const lines = paragraphs.reduce((sum, text) => sum + wrapText(text, { font: "sans", size }, textWidth).length, 0);
    const height = 12 + lines * size * leading + paragraphs.length * 1.8 + keepWith;
    if (height < 600) sheet.ensure(height);
  }
  const labels = wrapText(title, { font: "bold", size: 8.5 }, labelWidth - 14);
  sheet.ensure(Math.max(labels.length * 11.5, 28) + 8);
  sheet.rule({ ink: "hairline" });
  sheet.gap(4);
  const top = sheet.y;
  const page = sheet.page;
  labels.forEach((text, index) => sheet.line(text, { x: margin, y: top - 9.7 - index * 11.5, font: "bold", size: 8.5, ink: "tint" }));
  for (const text of paragraphs) paragraph(sheet, text);
  if (sheet.page === page) sheet.y = Math.min(sheet.y, top - labels.length * 11.5 - 2);
  sheet.gap(5);
}

/** A short paragraph is not torn apart by a page's end. */
function paragraph(sheet: Sheet, text: string): void {
  const lines = wrapText(text, { font: "sans", size }, textWidth).length;
  if (lines <= 4) sheet.ensure(lines * size * leading);
  sheet.text(text, { x: textX, width: textWidth, size, leading });
  sheet.gap(1.8);
}

function remark(sheet: Sheet, text: string): void {
  sheet.text(text, { x: textX, width: textWidth, size: 8.2, ink: "faint" });
  sheet.gap(12);
}

const present = (text: string): readonly string[] => (text.trim() === "" ? [] : [text]);

function orElse(texts: readonly string[], otherwise: string): readonly string[] {
  return texts.length > 0 ? texts : [otherwise];
}
