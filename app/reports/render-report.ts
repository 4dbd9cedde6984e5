import { drawFirstPage, kindNames } from "./draw-first-page.ts";
import { drawFurtherPages } from "./draw-further-pages.ts";
import { drawValuationPages } from "./draw-valuation-pages.ts";
import type { ReportView } from "./report-view.ts";
import { margin, pageWidth, Sheet } from "./sheet.ts";

/** A report's PDF. Pure but for the font files that it reads once: the same view gives the same bytes. */
export async function renderReport(view: ReportView): Promise<Uint8Array> {
  const sheet = await Sheet.open((opened) => {
    if (view.isDraft) opened.watermark("Draft");
  });
  const { pdf } = sheet;
  pdf.setTitle(`${view.number} · ${view.conclusion.title}`, { showInWindowTitleBar: true });
  pdf.setAuthor(view.laboratory.name);
  pdf.setSubject(kindNames[view.kind]);
  pdf.setLanguage("en");
  pdf.setCreator("Isogyre");
  pdf.setProducer("Isogyre");
  const authorisedAt = new Date(view.authorisedAt);
  pdf.setCreationDate(authorisedAt);
  pdf.setModificationDate(authorisedAt);

  await drawFirstPage(sheet, view);
  drawFurtherPages(sheet, view);
  if (view.valuation) drawValuationPages(sheet, view, view.valuation);
  sheet.gap(6);
  sheet.text("End of the report", { x: margin, width: pageWidth - 2 * margin, size: 8.5, ink: "faint" });

  const pages = pdf.getPages();
  pages.forEach((page, index) => {
    sheet.page = page;
    sheet.y = 46;
    sheet.rule({ thickness: 0.5 });
    sheet.line(`${view.isDraft ? "Draft, not issued · " : ""}${view.laboratory.name} · ${view.number}`, { x: margin, y: 33, size: 7.8, ink: "faint" });
    sheet.line(`Page ${index + 1} of ${pages.length}`, { x: pageWidth - margin, y: 33, size: 7.8, ink: "faint", align: "right" });
  });
  return pdf.save();
}
