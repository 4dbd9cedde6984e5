import { drawQr } from "./draw-qr.ts";
import { drawRows } from "./draw-rows.ts";
import type { ReportView } from "./report-view.ts";
import { inks, margin, pageHeight, pageWidth, type Sheet } from "./sheet.ts";
import { wrapText } from "./wrap-text.ts";

const columnGap = 25;
const rightWidth = 201;
const leftWidth = pageWidth - 2 * margin - rightWidth - columnGap;
const rightX = pageWidth - margin - rightWidth;

export const kindNames = { identification: "Gemstone identification report", identificationWithValuation: "Identification and valuation report" } as const;

/** The page that people look at: who, what, the stone's picture, the readings, how to check it, who signed. */
export async function drawFirstPage(sheet: Sheet, view: ReportView): Promise<void> {
  sheet.newPage();
  drawLetterhead(sheet, view);
  const top = sheet.y;

  await drawRightColumn(sheet, view, top);
  const firstPage = sheet.page;
  sheet.y = top;
  sheet.text("Conclusion", { x: margin, width: leftWidth, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
  sheet.text(view.conclusion.title, { x: margin, width: leftWidth, font: "serif", size: 24, leading: 1.2 });
  sheet.gap(3);
  for (const statement of view.conclusion.statements) sheet.text(statement, { x: margin, width: leftWidth, size: 11 });
  sheet.gap(12);
  heading(sheet, "Description", margin, leftWidth);
  drawRows(sheet, view.description, { x: margin, width: leftWidth });
  sheet.gap(10);
  heading(sheet, "Observations", margin, leftWidth);
  drawRows(sheet, view.observations, { x: margin, width: leftWidth });
  sheet.gap(12);
  if (sheet.page === firstPage && sheet.y > 190) sheet.y = Math.min(sheet.y, 190);
  drawSignatures(sheet, view);
}

function drawLetterhead(sheet: Sheet, view: ReportView): void {
  const { laboratory } = view;
  const rightEdge = pageWidth - margin;
  const y = pageHeight - 60;
  const nameSize = laboratory.name.length > 34 ? 14 : 18;
  const name = wrapText(sheet.fonts, laboratory.name, { font: "serif", size: nameSize }, 330)[0]!;
  sheet.line(name, { x: margin, y, font: "serif", size: nameSize });
  const contact = [...laboratory.addressLines, laboratory.phone, laboratory.email].filter(Boolean).join(" · ");
  wrapText(sheet.fonts, contact, { font: "sans", size: 8.5 }, 320)
    .slice(0, 3)
    .forEach((text, index) => sheet.line(text, { x: margin, y: y - 18 - index * 11, size: 8.5, ink: "soft" }));
  sheet.line(kindNames[view.kind], { x: rightEdge, y: y + 5, size: 8.5, ink: "soft", align: "right" });
  sheet.line(view.number, { x: rightEdge, y: y - 9.5, font: "mono", size: 12, align: "right" });
  sheet.line(`${view.reportOn} · version ${view.version}`, { x: rightEdge, y: y - 23, size: 8.5, ink: "soft", align: "right" });
  sheet.y = y - 42;
  sheet.rule({ thickness: 0.9, ink: "ink" });
  sheet.gap(20);
}

export function heading(sheet: Sheet, text: string, x: number, width: number): void {
  sheet.ensure(40);
  sheet.text(text, { x, width, font: "bold", size: 8.5, ink: "tint" });
  sheet.gap(2);
}

async function drawRightColumn(sheet: Sheet, view: ReportView, top: number): Promise<void> {
  let y = top;
  if (view.photograph?.jpeg) {
    const image = await sheet.pdf.embedJpg(view.photograph.jpeg);
    const scale = Math.min(rightWidth / image.width, rightWidth / image.height);
    const [width, height] = [image.width * scale, image.height * scale];
    sheet.page.drawImage(image, { x: rightX + (rightWidth - width) / 2, y: y - height, width, height });
    y -= height + 13;
    for (const line of wrapText(sheet.fonts, view.photograph.caption, { font: "sans", size: 7.8 }, rightWidth)) {
      sheet.line(line, { x: rightX, y, size: 7.8, ink: "faint" });
      y -= 10.5;
    }
    y -= 12;
  }
  const boxHeight = 88;
  y -= boxHeight;
  sheet.page.drawRectangle({ x: rightX, y, width: rightWidth, height: boxHeight, borderColor: inks.rule, borderWidth: 0.7 });
  drawQr(sheet.page, view.verification.url, { x: rightX + 11, y: y + 11, size: 66 });
  const textX = rightX + 88;
  sheet.line("Check this report", { x: textX, y: y + 62, font: "bold", size: 8.5 });
  sheet.line("Scan, or enter the code", { x: textX, y: y + 48, size: 8.5, ink: "soft" });
  const [first, second] = [view.verification.code.slice(0, 10), view.verification.code.slice(10)];
  sheet.line(first, { x: textX, y: y + 33, font: "mono", size: 9.5 });
  sheet.line(second, { x: textX, y: y + 21, font: "mono", size: 9.5 });

  y -= 20;
  const facts: Array<[string, string]> = [
    ["Stone", view.stoneCode],
    ["Receipt", view.receiptNumber],
    ["Received", view.receivedOn],
    ["Examined", view.examinedOn],
    ["For", view.clientName],
  ];
  for (const [label, value] of facts) {
    sheet.line(label, { x: rightX, y, size: 8.5, ink: "soft" });
    for (const line of wrapText(sheet.fonts, value, { font: "sans", size: 8.5 }, rightWidth - 56).slice(0, 3)) {
      sheet.line(line, { x: rightX + 56, y, size: 8.5 });
      y -= 12;
    }
  }
}

export function drawSignatures(sheet: Sheet, view: ReportView): void {
  const gap = 26;
  const width = (pageWidth - 2 * margin - gap) / 2;
  for (let at = 0; at < view.signatures.length; at += 2) {
    sheet.ensure(70);
    const top = sheet.y - 18;
    view.signatures.slice(at, at + 2).forEach((signature, index) => {
      const x = margin + index * (width + gap);
      sheet.y = top;
      sheet.rule({ x, width, thickness: 0.9, ink: "ink" });
      const who = [signature.name, signature.title].filter(Boolean).join(", ");
      sheet.line(wrapText(sheet.fonts, who, { font: "bold", size: 9.2 }, width)[0]!, { x, y: top - 14, font: "bold", size: 9.2 });
      sheet.line(signature.statement, { x, y: top - 27, size: 8.8, ink: "soft" });
      sheet.line(signature.onDate, { x, y: top - 39, size: 8.8, ink: "soft" });
    });
    sheet.y = top - 46;
  }
}
