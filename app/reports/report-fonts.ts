import { readFileSync } from "node:fs";
import path from "node:path";
import fontkit from "@pdf-lib/fontkit";
import type { PDFDocument, PDFFont } from "pdf-lib";

// TTF only: a subset of a woff2 file ends the process, and an unsubset one is not a valid PDF font.
const files = {
  serif: "lora/500Medium/Lora_500Medium.ttf",
  sans: "ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf",
  bold: "ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf",
  mono: "ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf",
  // Lora has no Greek beyond μ Ω Δ π and no subscripts.
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
const missingGlyph = "□";

type Parsed = { bytes: Uint8Array; font: ReturnType<typeof fontkit.create>; covers: ReadonlySet<number>; widths: Map<string, number> };
let parsed: Record<FontName, Parsed> | undefined;

/** Parsing the faces is most of a report's time: done once a process. */
function faces(): Record<FontName, Parsed> {
  if (!parsed) {
    const opened = {} as Record<FontName, Parsed>;
    for (const name of names) {
      const file = readFileSync(path.resolve("node_modules/@expo-google-fonts", files[name]));
      // The reader looks a few bytes past an empty glyph at a file's end (Plex Mono's space): give it zeros to find.
      const bytes = new Uint8Array(file.byteLength + 16);
      bytes.set(file);
      const font = fontkit.create(bytes);
      opened[name] = { bytes, font, covers: new Set(font.characterSet), widths: new Map() };
    }
    parsed = opened;
  }
  return parsed;
}

export type Fonts = Readonly<Record<FontName, PDFFont>>;

export async function embedFonts(pdf: PDFDocument): Promise<Fonts> {
  const all = faces();
  const byBytes = new Map(Object.values(all).map(({ bytes, font }) => [bytes, font]));
  pdf.registerFontkit({ create: (bytes: Uint8Array) => byBytes.get(bytes) ?? fontkit.create(bytes) } as typeof fontkit);
  const embedded = {} as Record<FontName, PDFFont>;
  for (const name of names) embedded[name] = await pdf.embedFont(all[name].bytes, { subset: true });
  return embedded;
}

export type Run = { font: FontName; text: string };

/** Cuts a text into runs that one face can write. What no face can write becomes a box: seen to be missing, never dropped. */
export function runsOf(text: string, font: FontName): Run[] {
  const all = faces();
  const runs: Run[] = [];
  for (const character of plain(text)) {
    const found = fallbacks[font].find((name) => all[name].covers.has(character.codePointAt(0)!));
    const run = found ? { font: found, text: character } : { font: "mono" as const, text: missingGlyph };
    const last = runs.at(-1);
    if (last?.font === run.font) last.text += run.text;
    else runs.push(run);
  }
  return runs;
}

/** Width of one line at a size; measured once a word. */
export function widthOf(fonts: Fonts, text: string, font: FontName, size: number): number {
  const { widths } = faces()[font];
  let width = widths.get(text);
  if (width === undefined) {
    width = runsOf(text, font).reduce((sum, run) => sum + fonts[run.font].widthOfTextAtSize(run.text, 1), 0);
    if (widths.size > 20_000) widths.clear();
    widths.set(text, width);
  }
  return width * size;
}

/** Composed characters, no controls, no invisible direction marks: what is printed is what is read. */
function plain(text: string): string {
   
  return text.normalize("NFC").replace(/[\t\n\r]+/g, " ").replace(/[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u202a-\u202e\u2060-\u2069\ufe00-\ufe0f\ufeff]/g, "");
}
