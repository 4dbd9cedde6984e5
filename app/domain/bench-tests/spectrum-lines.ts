import { parseDecimal } from "../decimal.ts";

/** A line or band of a spectrum seen by eye. */
export type SpectrumLine = Readonly<{
  /** Middle, nm. */
  nm: number;
  /** Half of a band's width, nm; 0 for a line. */
  halfWidthNm: number;
  kind: "line" | "band";
  strength: "strong" | "medium" | "weak" | "faint" | null;
  /** Shines instead of being dark. */
  isEmission: boolean;
}>;
export type ReadLines = Readonly<{ lines: readonly SpectrumLine[]; problem: string | null }>;

const mostLines = 30;
const [least, most] = [380, 780];
const strengths = ["strong", "medium", "weak", "faint"] as const;

/**
 * Lines and bands as they are typed: "694 e, 668 weak, 540-580 band strong". Wavelengths in nm, 380 to 780; commas,
 * semicolons or new lines between; a range is a band, and so is a middle with the word "band" (taken as 20 nm wide).
 *
 * @returns the lines in the order of their wavelengths, or the first thing that cannot be read, as a sentence
 */
export function readSpectrumLines(text: string): ReadLines {
  const parts = text.split(/[,;\n]+/).map((part) => part.trim()).filter(Boolean);
  const refuse = (problem: string): ReadLines => ({ lines: [], problem });
  if (parts.length > mostLines) return refuse(`At most ${mostLines} lines and bands; these are ${parts.length}.`);
  const lines: SpectrumLine[] = [];
  for (const part of parts) {
    const match = /^(\d{3}(?:\.\d{1,2})?)(?:\s*[-–]\s*(\d{3}(?:\.\d{1,2})?))?((?:\s+[a-z]+)*)$/i.exec(part);
    if (!match) return refuse(`“${part.slice(0, 40)}” is no line or band: write its nanometres first, as in “694” or “540-580 band”.`);
    const from = parseDecimal(match[1]!)!;
    const to = match[2] === undefined ? null : parseDecimal(match[2])!;
    const words = (match[3] ?? "").toLowerCase().split(/\s+/).filter(Boolean);
    const unknown = words.find((word) => !["band", "line", "e", "emission", ...strengths].includes(word));
    if (unknown) return refuse(`“${unknown}” is not understood: strong, medium, weak or faint, band, or e for emission.`);
    for (const nm of to === null ? [from] : [from, to]) if (nm < least || nm > most) return refuse(`${nm} nm lies outside ${least} to ${most} nm.`);
    if (to !== null && to <= from) return refuse(`A band runs from the shorter to the longer wave: ${part} does not.`);
    const isBand = to !== null || words.includes("band");
    lines.push({
      nm: to === null ? from : (from + to) / 2,
      halfWidthNm: to === null ? (isBand ? 10 : 0) : (to - from) / 2,
      kind: isBand ? "band" : "line",
      strength: strengths.find((strength) => words.includes(strength)) ?? null,
      isEmission: words.includes("e") || words.includes("emission"),
    });
  }
  return { lines: lines.sort((a, b) => a.nm - b.nm), problem: null };
}
