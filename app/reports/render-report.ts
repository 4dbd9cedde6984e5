import { drawEndMark } from "./draw-end-mark.ts";
import { drawFirstPage, kindNames } from "./draw-first-page.ts";
import { drawFurtherPages } from "./draw-further-pages.ts";
import { drawValuationPages } from "./draw-valuation-pages.ts";
import type { ReportView } from "./report-view.ts";
import { margin, pageHeight, pageWidth, Sheet } from "./sheet.ts";
import { wrapAtMost } from "./wrap-text.ts";

/** A report's PDF. Pure but for the font files that it reads once: the same view gives the same bytes. */
export async function renderReport(view: ReportView): Promise<Uint8Array> {
  const sheet = await Sheet.open((opened) => {
    if (view.isDraft) opened.watermark("Draft");
    if (opened.pdf.getPageCount() > 1) drawRunningHead(opened, view);
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
  drawEndMark(sheet, view.number);
  drawFooters(sheet, view);
  // It has a thread of its own: no need to yield between objects.
  return pdf.save({ objectsPerTick: Infinity });
}

function drawRunningHead(sheet: Sheet, view: ReportView): void {
  const y = pageHeight - 38;
  sheet.line(wrapAtMost(1, view.laboratory.name, { font: "serif", size: 10 }, 330)[0]!, { x: margin, y, font: "serif", size: 10 });
  sheet.line(view.number, { x: pageWidth - margin, y, font: "mono", size: 9.5, align: "right" });
  sheet.y = y - 9;
  sheet.rule({ thickness: 0.9, ink: "ink" });
  sheet.gap(14);
}

/** Last, when the number of pages is known. */
function drawFooters(sheet: Sheet, view: ReportView): void {
  const pages = sheet.pdf.getPages();
  const text = `${view.isDraft ? "Draft, not issued · " : ""}${view.number} · ${view.laboratory.name}`;
  const [left] = wrapAtMost(1, text, { font: "sans", size: 7.8 }, 400);
  pages.forEach((page, index) => {
    sheet.page = page;
    sheet.y = 46;
    sheet.rule({ thickness: 0.5 });
    sheet.line(left!, { x: margin, y: 33, size: 7.8, ink: "faint" });
    sheet.line(`Page ${index + 1} of ${pages.length}`, { x: pageWidth - margin, y: 33, size: 7.8, ink: "faint", align: "right" });
  });
}
