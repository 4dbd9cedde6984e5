import { degrees, PDFDocument, rgb, type PDFPage } from "pdf-lib";
import { interferenceColour } from "#app/domain/interference-colour.ts";
import { embedFonts, runsOf, widthOf, type FontName, type Fonts } from "./report-fonts.ts";
import { wrapText } from "./wrap-text.ts";

/** A4 in points. */
export const pageWidth = 595.28;
export const pageHeight = 841.89;
export const margin = 43.5;
const bottomMargin = 62;

const hex = (text: string) => rgb(parseInt(text.slice(0, 2), 16) / 255, parseInt(text.slice(2, 4), 16) / 255, parseInt(text.slice(4, 6), 16) / 255);
export const inks = { ink: hex("211c29"), soft: hex("5d5666"), faint: hex("6d6676"), tint: hex("6a1b7d"), rule: hex("d5cdbd"), straw: hex("7a5200"), red: hex("a62a3b") };
export type Ink = keyof typeof inks;

export type TextOptions = { x: number; width: number; font?: FontName; size?: number; ink?: Ink; leading?: number };

/** Pages that fill from the top. `y` is the baseline line's top of what comes next; points, origin at the page's lower left. */
export class Sheet {
  readonly pdf: PDFDocument;
  readonly fonts: Fonts;
  readonly #onNewPage: (sheet: Sheet) => void;
  page!: PDFPage;
  y = 0;

  private constructor(pdf: PDFDocument, fonts: Fonts, onNewPage: (sheet: Sheet) => void) {
    this.pdf = pdf;
    this.fonts = fonts;
    this.#onNewPage = onNewPage;
  }

  static async open(onNewPage: (sheet: Sheet) => void): Promise<Sheet> {
    const pdf = await PDFDocument.create({ updateMetadata: false });
    return new Sheet(pdf, await embedFonts(pdf), onNewPage);
  }

  newPage(): void {
    this.page = this.pdf.addPage([pageWidth, pageHeight]);
    this.y = pageHeight - 40;
    drawRamp(this.page);
    this.#onNewPage(this);
  }

  /** Turns the page when less than `height` is left. */
  ensure(height: number): void {
    if (this.y - height < bottomMargin) this.newPage();
  }

  /** One line at a point, without wrapping. */
  line(text: string, { x, y, font = "sans", size = 9.5, ink = "ink", align = "left" }: { x: number; y: number; font?: FontName; size?: number; ink?: Ink; align?: "left" | "right" }): number {
    let at = align === "right" ? x - widthOf(this.fonts, text, font, size) : x;
    for (const run of runsOf(text, font)) {
      this.page.drawText(run.text, { x: at, y, size, font: this.fonts[run.font], color: inks[ink] });
      at += this.fonts[run.font].widthOfTextAtSize(run.text, size);
    }
    return at;
  }

  /** A wrapped text below what is there; goes on over pages. */
  text(text: string, { x, width, font = "sans", size = 9.5, ink = "ink", leading = 1.42 }: TextOptions): void {
    for (const line of wrapText(this.fonts, text, { font, size }, width)) {
      this.ensure(size * leading);
      this.y -= size * leading;
      this.line(line, { x, y: this.y + size * (leading - 1) * 0.5 + size * 0.1, font, size, ink });
    }
  }

  rule({ x = margin, width = pageWidth - 2 * margin, thickness = 0.6, ink = "rule" as Ink } = {}): void {
    this.page.drawLine({ start: { x, y: this.y }, end: { x: x + width, y: this.y }, thickness, color: inks[ink] });
  }

  gap(height: number): void {
    this.y -= height;
  }

  watermark(text: string): void {
    this.page.drawText(text, { x: 120, y: 250, size: 110, font: this.fonts.serif, color: inks.rule, opacity: 0.45, rotate: degrees(45) });
  }
}

/** The interference colours of a wedge along the top edge, R = 0 to 1800 nm. */
function drawRamp(page: PDFPage): void {
  const steps = 120;
  for (let i = 0; i < steps; i++) {
    const { red, green, blue } = interferenceColour((1800 * (i + 0.5)) / steps);
    page.drawRectangle({ x: (pageWidth * i) / steps, y: pageHeight - 4.5, width: pageWidth / steps + 0.3, height: 4.5, color: rgb(red, green, blue) });
  }
}
