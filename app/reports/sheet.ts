import { deflateSync } from "node:zlib";
import { beginText, closePath, degrees, endText, appendBezierCurve, lineTo, moveText, moveTo, PDFDocument, rgb, setFillingColor, setFontAndSize, showText, type PDFName, type PDFOperator, type PDFPage, type PDFRef } from "pdf-lib";
import { drawRamp, embedRamp } from "./draw-ramp.ts";
import { embedFonts, runsOf, widthOf, type FontName, type Fonts } from "./report-fonts.ts";
import { wrapText } from "./wrap-text.ts";

/** A4 in points. */
export const pageWidth = 595.28;
export const pageHeight = 841.89;
export const margin = 43.5;
export const fullWidth = pageWidth - 2 * margin;
const footerFloor = 62;

const hex = (text: string) => rgb(parseInt(text.slice(0, 2), 16) / 255, parseInt(text.slice(2, 4), 16) / 255, parseInt(text.slice(4, 6), 16) / 255);
export const inks = {
  ink: hex("211c29"),
  soft: hex("5d5666"),
  faint: hex("6d6676"),
  tint: hex("6a1b7d"),
  rule: hex("d5cdbd"),
  hairline: hex("e6e0d4"),
  blue: hex("1f4fa3"),
  straw: hex("7a5200"),
  strawGround: hex("fbf1d9"),
  red: hex("a62a3b"),
};
export type Ink = keyof typeof inks;

export type TextOptions = { x: number; width: number; font?: FontName; size?: number; ink?: Ink; leading?: number };
export type LineOptions = { x: number; y: number; font?: FontName; size?: number; ink?: Ink; align?: "left" | "right" | "centre" };

/** Pages that fill from the top. `y` is where the next thing's upper edge comes; points, origin at the page's lower left. */
export class Sheet {
  readonly pdf: PDFDocument;
  readonly #fonts: Fonts;
  readonly #ramp: PDFRef;
  readonly #onNewPage: (sheet: Sheet) => void;
  readonly #fontKeys = new Map<PDFPage, Map<FontName, PDFName>>();
  page!: PDFPage;
  y = 0;
  /** Nothing that flows goes below; the first page keeps more room than the others. */
  floor = footerFloor;

  private constructor(pdf: PDFDocument, fonts: Fonts, onNewPage: (sheet: Sheet) => void) {
    this.pdf = pdf;
    this.#fonts = fonts;
    this.#ramp = embedRamp(pdf, { width: pageWidth });
    this.#onNewPage = onNewPage;
  }

  static async open(onNewPage: (sheet: Sheet) => void): Promise<Sheet> {
    const pdf = await PDFDocument.create({ updateMetadata: false });
    compressNatively(pdf);
    return new Sheet(pdf, await embedFonts(pdf), onNewPage);
  }

  newPage(): void {
    this.page = this.pdf.addPage([pageWidth, pageHeight]);
    this.y = pageHeight - 40;
    this.floor = footerFloor;
    drawRamp(this.page, this.#ramp, { height: 4.5 });
    this.#onNewPage(this);
  }

  /** Turns the page when less than `height` is left. */
  ensure(height: number): void {
    if (this.y - height < this.floor) this.newPage();
  }

  /** One line with its baseline at a point, without wrapping. Returns where it ends. */
  line(text: string, { x, y, font = "sans", size = 9.5, ink = "ink", align = "left" }: LineOptions): number {
    const width = widthOf(text, font, size);
    let at = align === "right" ? x - width : align === "centre" ? x - width / 2 : x;
    for (const run of runsOf(text, font)) {
      this.page.pushOperators(
        beginText(),
        setFillingColor(inks[ink]),
        setFontAndSize(this.#fontKey(run.font), size),
        moveText(round(at), round(y)),
        showText(this.#fonts[run.font].encodeText(run.text)),
        endText(),
      );
      at += widthOf(run.text, run.font, size);
    }
    return at;
  }

  /** A wrapped text below what is there; goes on over pages. */
  text(text: string, { x, width, font = "sans", size = 9.5, ink = "ink", leading = 1.42 }: TextOptions): void {
    for (const line of wrapText(text, { font, size }, width)) {
      this.ensure(size * leading);
      this.y -= size * leading;
      this.line(line, { x, y: this.y + size * (leading - 1) * 0.5 + size * 0.1, font, size, ink });
    }
  }

  rule({ x = margin, width = fullWidth, thickness = 0.6, ink = "rule" as Ink } = {}): void {
    this.page.drawLine({ start: { x, y: round(this.y) }, end: { x: round(x + width), y: round(this.y) }, thickness, color: inks[ink] });
  }

  gap(height: number): void {
    this.y -= height;
  }

  watermark(text: string): void {
    const size = 150;
    const half = widthOf(text, "serif", size) / 2;
    const centre = { x: pageWidth / 2, y: pageHeight / 2 };
    // Turned by 45° about the page's middle.
    this.page.drawText(text, { x: centre.x - (half - size * 0.25) * Math.SQRT1_2, y: centre.y - (half + size * 0.25) * Math.SQRT1_2, size, font: this.#fonts.serif, color: inks.rule, opacity: 0.4, rotate: degrees(45) });
  }

  #fontKey(name: FontName): PDFName {
    const keys = this.#fontKeys.get(this.page) ?? new Map<FontName, PDFName>();
    this.#fontKeys.set(this.page, keys);
    const key = keys.get(name) ?? this.page.node.newFontDictionary(name, this.#fonts[name].ref);
    keys.set(name, key);
    return key;
  }
}

/** Fonts are most of what is compressed, and the library's own compressor, in script, takes several times as long as Node's. */
function compressNatively({ context }: PDFDocument): void {
  context.flateStream = (contents, dict = {}) => context.stream(deflateSync(typeof contents === "string" ? Buffer.from(contents, "latin1") : contents), { ...dict, Filter: "FlateDecode" });
}

/** The outline of a rectangle with rounded corners, for clipping or stroking. */
export function roundedRectangle({ x, y, width, height, radius }: { x: number; y: number; width: number; height: number; radius: number }): PDFOperator[] {
  // A quarter circle as one cubic curve: its handles are this share of the radius.
  const handle = radius * 0.5523;
  const [right, top] = [x + width, y + height];
  return [
    moveTo(x + radius, y),
    lineTo(right - radius, y),
    appendBezierCurve(right - radius + handle, y, right, y + radius - handle, right, y + radius),
    lineTo(right, top - radius),
    appendBezierCurve(right, top - radius + handle, right - radius + handle, top, right - radius, top),
    lineTo(x + radius, top),
    appendBezierCurve(x + radius - handle, top, x, top - radius + handle, x, top - radius),
    lineTo(x, y + radius),
    appendBezierCurve(x, y + radius - handle, x + radius - handle, y, x + radius, y),
    closePath(),
  ];
}

/** Hundredths of a point are finer than any printer, and short numbers keep the file small. */
export function round(points: number): number {
  return Math.round(points * 100) / 100;
}
