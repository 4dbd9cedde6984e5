import { widthOf, type FontName } from "./report-fonts.ts";

export type TextStyle = Readonly<{ font: FontName; size: number }>;

/** Lines of a text that fit a width. Words that are wider than a line are cut; line breaks in the text are kept. */
export function wrapText(text: string, { font, size }: TextStyle, width: number): string[] {
  const lines: string[] = [];
  const space = widthOf(" ", font, size);
  for (const paragraph of text.split(/\r?\n/)) {
    let line = "";
    let lineWidth = 0;
    for (const word of paragraph.split(/[ \t]+/).filter(Boolean).flatMap((each) => cut(each, { font, size }, width))) {
      const wordWidth = widthOf(word, font, size);
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

/** At most so many lines; where more would be needed the last one ends in an ellipsis, so that the cut is seen. */
export function wrapAtMost(mostLines: number, text: string, style: TextStyle, width: number): string[] {
  const lines = wrapText(text, style, width);
  if (lines.length <= mostLines) return lines;
  const kept = lines.slice(0, mostLines);
  let last = [...kept[mostLines - 1]!];
  while (last.length > 0 && widthOf(`${last.join("").trimEnd()} …`, style.font, style.size) > width) last = last.slice(0, -1);
  kept[mostLines - 1] = `${last.join("").trimEnd()} …`;
  return kept;
}

function cut(word: string, { font, size }: TextStyle, width: number): string[] {
  if (widthOf(word, font, size) <= width) return [word];
  const pieces: string[] = [];
  let piece = "";
  let pieceWidth = 0;
  for (const character of word) {
    const characterWidth = widthOf(character, font, size);
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
