import { readFileSync } from "node:fs";
import path from "node:path";
import fontkit, { type Font, type Glyph } from "@pdf-lib/fontkit";
import type { PDFDocument, PDFFont } from "pdf-lib";

// TTF only: a subset of a woff2 file ends the process, and an unsubset one is not a valid PDF font.
const files = {
  serif: "lora/500Medium/Lora_500Medium.ttf",
  sans: "ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf",
  bold: "ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf",
  mono: "ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf",
  // Lora has no Greek beyond μ Ω Δ π and no subscripts; Plex Mono has no Greek at all.
  greek: "source-serif-4/400Regular/SourceSerif4_400Regular.ttf",
} as const;
export type FontName = keyof typeof files;
const names = Object.keys(files) as FontName[];

/** Where a character is looked for when the face of the text lacks it. */
const fallbacks: Record<FontName, readonly FontName[]> = {
  serif: ["serif", "greek", "sans", "mono"],
  sans: ["sans", "greek", "mono"],
  bold: ["bold", "sans", "greek", "mono"],
  mono: ["mono", "sans", "greek"],
  greek: ["greek", "sans", "mono"],
};
/** Source Serif's ballot box: of the faces here only it has a box at all. */
const missing = { font: "greek", text: "☐" } as const;

/** A word's glyphs and its width in ems. */
type Shaped = { glyphs: Glyph[]; widthEm: number };
type Face = {
  bytes: Uint8Array;
  font: Font;
  covers: ReadonlySet<number>;
  shaped: Map<string, Shaped>;
  /** Widths in ems of texts asked for in this face, fallbacks included. */
  measured: Map<string, number>;
};
/** A laboratory's words return from report to report; beyond so many a map starts anew. */
const mostRemembered = 20_000;
let parsed: Record<FontName, Face> | undefined;

/** Parsing the faces is most of a first report's time: done once a process. */
function faces(): Record<FontName, Face> {
  parsed ??= Object.fromEntries(names.map((name) => [name, openFace(files[name])])) as Record<FontName, Face>;
  return parsed;
}

function openFace(file: string): Face {
  const read = readFileSync(path.resolve("node_modules/@expo-google-fonts", file));
  // The reader looks a few bytes past an empty glyph at a file's end (Plex Mono's space): give it zeros to find.
  const bytes = new Uint8Array(read.byteLength + 16);
  bytes.set(read);
  const font = fontkit.create(bytes);
  // A glyph is remembered with the first character that asked for it, and that goes into the PDF's text layer. Ask in
  // order, without the ligature characters, or what was printed before would decide how this report's text comes out.
  const covers = new Set(font.characterSet);
  for (const codePoint of [...covers].sort((a, b) => a - b)) if (codePoint < 0xfb00 || codePoint > 0xfb06) font.glyphForCodePoint(codePoint);
  return { bytes, font, covers, shaped: new Map(), measured: new Map() };
}

export type Fonts = Readonly<Record<FontName, PDFFont>>;

export async function embedFonts(pdf: PDFDocument): Promise<Fonts> {
  const all = faces();
  const byBytes = new Map(names.map((name) => [all[name].bytes, shapingByWord(all[name])]));
  pdf.registerFontkit({ create: (bytes: Uint8Array) => byBytes.get(bytes)! } as typeof fontkit);
  const embedded = {} as Record<FontName, PDFFont>;
  for (const name of names) embedded[name] = await pdf.embedFont(all[name].bytes, { subset: true });
  return embedded;
}

/** The same face, but it lays a text out word by word from what is already known. The PDF library ignores kerning anyway. */
function shapingByWord(face: Face): Font {
  return Object.create(face.font, { layout: { value: (text: string) => ({ glyphs: shapeWords(face, text).flatMap(({ glyphs }) => glyphs) }) } }) as Font;
}

function shapeWords(face: Face, text: string): Shaped[] {
  // The shaper's time grows with the square of a word's length: a word without end is shaped in pieces.
  return (text.match(/ {1,40}|[^ ]{1,40}/gu) ?? []).map((word) => {
    const known = face.shaped.get(word);
    if (known) return known;
    const { glyphs } = face.font.layout(word);
    const shaped = { glyphs, widthEm: glyphs.reduce((sum, { advanceWidth }) => sum + advanceWidth, 0) / face.font.unitsPerEm };
    remember(face.shaped, word, shaped);
    return shaped;
  });
}

export type Run = { font: FontName; text: string };

/** Cuts a text into runs that one face can write. What no face can write becomes a box: seen to be missing, never dropped. */
export function runsOf(text: string, font: FontName): Run[] {
  const all = faces();
  const runs: Run[] = [];
  for (const character of plain(text)) {
    const found = fallbacks[font].find((name) => all[name].covers.has(character.codePointAt(0)!));
    const run: Run = found ? { font: found, text: character } : missing;
    const last = runs.at(-1);
    if (last?.font === run.font) last.text += run.text;
    else runs.push({ ...run });
  }
  return runs;
}

/** Width of one run or line, in points. */
export function widthOf(text: string, font: FontName, size: number): number {
  const all = faces();
  const { measured } = all[font];
  const known = measured.get(text);
  if (known !== undefined) return known * size;
  let widthEm = 0;
  for (const run of runsOf(text, font)) for (const shaped of shapeWords(all[run.font], run.text)) widthEm += shaped.widthEm;
  remember(measured, text, widthEm);
  return widthEm * size;
}

function remember<Value>(map: Map<string, Value>, text: string, value: Value): void {
  // Long texts are not asked for twice, and would only hold memory.
  if (text.length > 80) return;
  if (map.size >= mostRemembered) map.clear();
  map.set(text, value);
}

/** Composed characters, no controls, no invisible direction marks: what is printed is what is read. */
function plain(text: string): string {
  return text
    .normalize("NFC")
    .replace(/[\t\n\r\u2028\u2029]+/g, " ")
    // The narrow space that groups a number's digits is in two faces only, and too narrow there to be seen in print.
    .replaceAll("\u202f", "\u00a0")
    .replace(/[\p{Cc}\u00ad\u061c\u200b-\u200f\u202a-\u202e\u2060-\u2069\ufe00-\ufe0f\ufeff]/gu, "");
}
