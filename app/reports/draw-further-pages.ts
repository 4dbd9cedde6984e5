import { heading } from "./draw-first-page.ts";
import type { ReportView } from "./report-view.ts";
import { margin, pageWidth, type Sheet } from "./sheet.ts";

const width = pageWidth - 2 * margin;

/** What the conclusion rests on and how far it reaches: treatments, evidence, alternatives, limits, methods, cautions. */
export function drawFurtherPages(sheet: Sheet, view: ReportView): void {
  sheet.newPage();
  const { treatments } = view;
  section(sheet, "Treatments: what was found", orElse(treatments.found, "Nothing was found by the methods used."));
  section(sheet, "Treatments: looked for and not found", orElse(treatments.notFound, "No treatment was excluded."));
  section(sheet, "Treatments: not determinable with the methods used", orElse(treatments.notDeterminable, "None is listed."));
  if (treatments.stated.length > 0) section(sheet, "Treatments: stated by the client, not verified", treatments.stated);
  paragraph(sheet, "The absence of a remark does not mean that a stone is untreated. The statements hold for the stone as it was examined on the dates given; a stone can be treated afterwards.", "faint");
  sheet.gap(9);

  section(sheet, "Evidence for the identity", [view.evidence]);
  if (view.natureEvidence) section(sheet, "Evidence for natural, synthetic or other nature", [view.natureEvidence]);
  if (view.rejected.length > 0) section(sheet, "Alternatives considered and rejected", view.rejected.map(({ name, because }) => `${name}: ${because}`));
  section(sheet, "Limits", view.limits);
  section(sheet, "Instruments and methods", view.instruments);
  section(sheet, "As received", [view.asReceived, ...(view.clientStatements ? [`Stated by the client, not verified: ${view.clientStatements}`] : [])]);
  if (view.amendment) {
    section(sheet, "Amendment", [`This report replaces ${view.amendment.supersedesNumber}.`, ...(view.amendment.reason ? [`What changed, and why: ${view.amendment.reason}`] : [])]);
  }
  section(sheet, "Care", view.cautions);
  section(sheet, "How to read this report", [
    "Figures in brackets are standard uncertainties in the last digits. Opinions are those of the signatories; results relate only to the stone examined, as received.",
    "This report is not a guarantee or an offer, and it must not be reproduced except in full. A valid code in the register proves the document, not the stone: compare the stone with the photograph, weight and measurements.",
    `Species table ${view.versions.speciesTable}. Dates are in the time zone ${view.timeZone}.`,
  ]);
}

export function section(sheet: Sheet, title: string, paragraphs: readonly string[]): void {
  if (paragraphs.length === 0) return;
  heading(sheet, title, margin, width);
  for (const text of paragraphs) paragraph(sheet, text);
  sheet.gap(9);
}

export function paragraph(sheet: Sheet, text: string, ink: "ink" | "faint" = "ink"): void {
  sheet.text(text, { x: margin, width, size: ink === "faint" ? 8.5 : 9.5, ink });
  sheet.gap(2.5);
}

function orElse(texts: readonly string[], otherwise: string): readonly string[] {
  return texts.length > 0 ? texts : [otherwise];
}
