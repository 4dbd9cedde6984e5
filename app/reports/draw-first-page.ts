import { clip, endPath, popGraphicsState, pushGraphicsState, setLineWidth, setStrokingColor, stroke } from "pdf-lib";
import { drawQr } from "./draw-qr.ts";
import { drawRotationPlot } from "./draw-rotation-plot.ts";
import { drawRows } from "./draw-rows.ts";
import { drawSignatures, signaturesHeight } from "./draw-signatures.ts";
import type { ReportView } from "./report-view.ts";
import { fullWidth, inks, margin, pageHeight, pageWidth, round, roundedRectangle, type Sheet } from "./sheet.ts";
import { wrapAtMost, wrapText } from "./wrap-text.ts";

const columnGap = 25;
const rightWidth = 201;
const leftWidth = fullWidth - rightWidth - columnGap;
const rightX = pageWidth - margin - rightWidth;
/** Above the footer: two lines of small print that belong under the signatures. */
const smallPrintTop = 84;

export const kindNames = { identification: "Gemstone identification report", identificationWithValuation: "Identification and valuation report" } as const;

/** The page that people look at: who, what, the stone's picture, the readings, how to check it, who signed. */
export async function drawFirstPage(sheet: Sheet, view: ReportView): Promise<void> {
  sheet.newPage();
  sheet.floor = smallPrintTop + 4;
  const firstPage = sheet.page;
  drawSmallPrint(sheet, view);
  drawLetterhead(sheet, view);
  const top = sheet.y;
  const rightBottom = await drawRightColumn(sheet, view, top);

  sheet.y = top;
  sheet.text("Conclusion", { x: margin, width: leftWidth, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
  const titleSize = titleSizeFor(view.conclusion.title);
  sheet.text(view.conclusion.title, { x: margin, width: leftWidth, font: "serif", size: titleSize, leading: 1.2 });
  sheet.gap(4);
  for (const statement of view.conclusion.statements) sheet.text(statement, { x: margin, width: leftWidth, size: 11 });
  sheet.gap(13);
  if (view.description.length > 0) {
    heading(sheet, "Description");
    drawRows(sheet, view.description, { x: margin, width: leftWidth });
    sheet.gap(11);
  }
  heading(sheet, "Observations");
  if (view.observations.length > 0) drawRows(sheet, view.observations, { x: margin, width: leftWidth });
  else sheet.text("No reading is reported. What the conclusion rests on is told overleaf.", { x: margin, width: leftWidth, ink: "soft" });

  const signatures = view.valuation ? view.signatures.slice(0, -1) : view.signatures;
  sheet.gap(4);
  if (sheet.page === firstPage) sheet.y = Math.min(sheet.y, rightBottom, Math.max(sheet.floor + signaturesHeight(signatures), 0) + 6);
  drawSignatures(sheet, signatures);
}

/** A long name in the largest size would push the readings off the page. */
function titleSizeFor(title: string): number {
  const lines = wrapText(title, { font: "serif", size: 24 }, leftWidth).length;
  return lines <= 2 ? 24 : lines <= 4 ? 18 : 13;
}

function heading(sheet: Sheet, text: string): void {
  sheet.ensure(40);
  sheet.text(text, { x: margin, width: leftWidth, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
}

function drawLetterhead(sheet: Sheet, view: ReportView): void {
  const { laboratory } = view;
  const rightEdge = pageWidth - margin;
  const y = pageHeight - 60;
  const nameWidth = 330;
  const fits = (size: number) => wrapText(laboratory.name, { font: "serif", size }, nameWidth).length === 1;
  const nameSize = [18, 16, 14, 12].find(fits) ?? 12;
  const names = wrapAtMost(2, laboratory.name, { font: "serif", size: nameSize }, nameWidth);
  names.forEach((text, index) => sheet.line(text, { x: margin, y: y - index * nameSize * 1.2, font: "serif", size: nameSize }));
  const contact = [...laboratory.addressLines, laboratory.phone, laboratory.email].filter(Boolean).join(" · ");
  const contactTop = y - 18 - (names.length - 1) * nameSize * 1.2;
  const contacts = wrapAtMost(2, contact, { font: "sans", size: 8.5 }, 320);
  contacts.forEach((text, index) => sheet.line(text, { x: margin, y: contactTop - index * 11, size: 8.5, ink: "soft" }));
  sheet.line(kindNames[view.kind], { x: rightEdge, y: y + 5, size: 8.5, ink: "soft", align: "right" });
  sheet.line(view.number, { x: rightEdge, y: y - 9.5, font: "mono", size: 12, align: "right" });
  sheet.line(`${view.reportOn} · version ${view.version}`, { x: rightEdge, y: y - 23, size: 8.5, ink: "soft", align: "right" });
  sheet.y = Math.min(y - 42, contactTop - (contacts.length - 1) * 11 - 14);
  sheet.rule({ thickness: 0.9, ink: "ink" });
  sheet.gap(18);
}

function drawSmallPrint(sheet: Sheet, view: ReportView): void {
  const what = view.kind === "identification" ? "It is not a valuation, a guarantee or an offer." : "It is not a guarantee or an offer; the value and its conditions stand on pages of their own.";
  const text = `This report gives the opinion of the signatories on the stone as examined on the dates above with the tests listed. ${what} Figures in brackets are standard uncertainties in the last digits.`;
  wrapAtMost(2, text, { font: "sans", size: 7.2 }, fullWidth).forEach((line, index) => sheet.line(line, { x: margin, y: smallPrintTop - 14 - index * 10, size: 7.2, ink: "faint" }));
}

/** Returns where the column ends. */
async function drawRightColumn(sheet: Sheet, view: ReportView, top: number): Promise<number> {
  let y = top;
  if (view.photograph?.jpeg) y = (await drawPhotograph(sheet, view.photograph.jpeg, view.photograph.caption, y, { mostHeight: view.rotationPlot ? 176 : rightWidth })) - 12;
  if (view.rotationPlot) {
    const [title, ...more] = wrapAtMost(2, `Rotation of the stone, ${view.rotationPlot.facetLabel}`, { font: "bold", size: 8.5 }, rightWidth);
    for (const text of [title!, ...more]) sheet.line(text, { x: rightX, y: (y -= 11), font: "bold", size: 8.5, ink: "tint" });
    drawRotationPlot(sheet, view.rotationPlot, { x: rightX, top: y - 4, width: rightWidth, height: 96 });
    const curves = view.rotationPlot.curves.map(({ label }, index) => `${label} ${index % 2 === 1 ? "broken" : "full"} line`);
    y -= 104;
    if (curves.length > 0) for (const text of wrapAtMost(2, [...curves, "rings: readings"].join("; "), { font: "sans", size: 7.2 }, rightWidth)) sheet.line(text, { x: rightX, y: (y -= 9.5), size: 7.2, ink: "faint" });
    y -= 12;
  }
  y = drawVerification(sheet, view, y) - 8;

  const contact = view.valuation ? [] : (view.clientContactLines ?? []);
  const facts: Array<[label: string, values: readonly string[]]> = [
    ["Stone", [view.stoneCode]],
    ["Receipt", [view.receiptNumber]],
    ["Received", [view.receivedOn]],
    ["Examined", [view.examinedOn]],
    ["For", [view.clientName, ...contact]],
  ];
  for (const [label, values] of facts) {
    sheet.line(label, { x: rightX, y: y - 12, size: 8.5, ink: "soft" });
    for (const text of values.slice(0, 5).flatMap((value) => wrapAtMost(2, value, { font: "sans", size: 8.5 }, rightWidth - 56))) sheet.line(text, { x: rightX + 56, y: (y -= 12), size: 8.5 });
  }
  return y - 6;
}

async function drawPhotograph(sheet: Sheet, jpeg: Uint8Array, caption: string, top: number, { mostHeight }: { mostHeight: number }): Promise<number> {
  const image = await sheet.pdf.embedJpg(jpeg);
  // Never cropped: what the edge of a picture shows is evidence too.
  const scale = Math.min(rightWidth / image.width, mostHeight / image.height);
  const [width, height] = [round(image.width * scale), round(image.height * scale)];
  const [x, y] = [round(rightX + (rightWidth - width) / 2), round(top - height)];
  sheet.page.pushOperators(pushGraphicsState(), ...roundedRectangle({ x, y, width, height, radius: Math.min(4, width / 2, height / 2) }), clip(), endPath());
  sheet.page.drawImage(image, { x, y, width, height });
  sheet.page.pushOperators(popGraphicsState());
  let below = y - 3;
  for (const line of wrapAtMost(3, caption, { font: "sans", size: 7.8 }, rightWidth)) sheet.line(line, { x: rightX, y: (below -= 10.5), size: 7.8, ink: "faint" });
  return below;
}

function drawVerification(sheet: Sheet, view: ReportView, top: number): number {
  const height = 88;
  const y = top - height;
  sheet.page.pushOperators(
    pushGraphicsState(),
    setStrokingColor(inks.rule),
    setLineWidth(0.7),
    ...roundedRectangle({ x: rightX, y, width: rightWidth, height, radius: 4 }),
    stroke(),
    popGraphicsState(),
  );
  drawQr(sheet.page, view.verification.url, { x: rightX + 11, y: y + 11, size: 66 });
  const x = rightX + 88;
  sheet.line("Check this report", { x, y: y + 67, font: "bold", size: 8.5 });
  const whereTo = wrapAtMost(2, `Scan, or enter at ${placeOf(view.verification.url)}`, { font: "sans", size: 8 }, rightWidth - 88 - 8);
  whereTo.forEach((text, index) => sheet.line(text, { x, y: y + 54 - index * 10.5, size: 8, ink: "soft" }));
  const [first, second] = [view.verification.code.slice(0, 10), view.verification.code.slice(10)];
  sheet.line(first, { x, y: y + 28, font: "mono", size: 9.5 });
  sheet.line(second, { x, y: y + 16, font: "mono", size: 9.5 });
  return y;
}

/** Where a code is typed in: the register's address without the code. */
function placeOf(url: string): string {
  return url.replace(/^https?:\/\//, "").replace(/\/[^/]*$/, "");
}
