import { fullWidth, inks, margin, pageWidth, type Sheet } from "./sheet.ts";
import { widthOf } from "./report-fonts.ts";

const size = 8.5;

/** Says where the report ends: a uniaxial figure, small, between two rules, and the words below. */
export function drawEndMark(sheet: Sheet, number: string): void {
  sheet.ensure(48);
  sheet.gap(20);
  const centre = { x: pageWidth / 2, y: sheet.y };
  const radius = 7;
  for (const share of [1, 0.62]) sheet.page.drawCircle({ ...centre, size: radius * share, borderWidth: 0.6, borderColor: inks.tint });
  for (const [dx, dy] of [[1, 0], [0, 1]] as const) {
    sheet.page.drawLine({ start: { x: centre.x - dx * radius, y: centre.y - dy * radius }, end: { x: centre.x + dx * radius, y: centre.y + dy * radius }, thickness: 1.3, color: inks.tint });
  }
  const reach = fullWidth / 2 - radius - 8;
  sheet.rule({ width: reach });
  sheet.rule({ x: centre.x + radius + 8, width: reach });
  const text = `End of the report ${number}`;
  sheet.line(text, { x: margin + (fullWidth - widthOf(text, "sans", size)) / 2, y: sheet.y - 20, size, ink: "soft" });
  sheet.gap(24);
}
