import { widthOf, type FontName, type Fonts } from "./report-fonts.ts";

export type TextStyle = Readonly<{ font: FontName; size: number }>;

/** Lines of a text that fit a width. Words that are wider than a line are cut; line breaks in the text are kept. */
export function wrapText(fonts: Fonts, text: string, { font, size }: TextStyle, width: number): string[] {
  const lines: string[] = [];
  const space = widthOf(fonts, " ", font, size);
  for (const paragraph of text.split(/\r?\n/)) {
    let line = "";
    let lineWidth = 0;
    for (const word of paragraph.split(/[ \t]+/).filter(Boolean).flatMap((each) => cut(fonts, each, { font, size }, width))) {
      const wordWidth = widthOf(fonts, word, font, size);
      if (line !== "" && lineWidth + space + wordWidth > width) {
        lines.push(line);
        line = "";
        lineWidth = 0;
      }
      lineWidth += (line === "" ? 0 : space) + wordWidth;
      line = line === "" ? word : `${line} ${word}`;
    }
    lines.push(line);
  }
  return lines;
}

function cut(fonts: Fonts, word: string, { font, size }: TextStyle, width: number): string[] {
  if (widthOf(fonts, word, font, size) <= width) return [word];
  const pieces: string[] = [];
  let piece = "";
  let pieceWidth = 0;
  for (const character of word) {
    const characterWidth = widthOf(fonts, character, font, size);
    if (piece !== "" && pieceWidth + characterWidth > width) {
      pieces.push(piece);
      piece = "";
      pieceWidth = 0;
    }
    piece += character;
    pieceWidth += characterWidth;
  }
  return [...pieces, piece];
}
