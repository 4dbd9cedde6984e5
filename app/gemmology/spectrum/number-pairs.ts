import { freeNumber } from "./free-number.ts";
import type { ValueLine } from "./labelled-records.ts";
import { SpectrumFileError } from "./measured-spectrum.ts";
import { mostSpectrumPoints } from "./spectrum-limits.ts";

export type PairedPoint = Readonly<{ x: number; y: number; line: number }>;

/**
 * The points of a table in the form (XY..XY), or of every group of `size` numbers the first two: x and y in free
 * format, a comma between them, groups apart by a blank, a semicolon or a new line.
 * @throws SpectrumFileError that names the line
 */
export function numberPairs(lines: readonly ValueLine[], size: 2 | 3 = 2): PairedPoint[] {
  const points: PairedPoint[] = [];
  let group: { value: number; line: number }[] = [];
  for (const { line, text } of lines) {
    let rest = text;
    for (;;) {
      rest = rest.replace(/^[\s,;]+/, "");
      if (rest === "") break;
      const read = freeNumber(rest);
      if (!read) throw new SpectrumFileError(line, `“${rest.slice(0, 12)}” is no number.`);
      group.push({ value: read.value, line });
      rest = rest.slice(read.written.length);
      if (group.length < size) continue;
      points.push({ x: group[0]!.value, y: group[1]!.value, line: group[0]!.line });
      if (points.length > mostSpectrumPoints) throw new SpectrumFileError(line, `There are more than ${mostSpectrumPoints.toLocaleString("en")} points here. Save the spectrum at a wider step.`);
      group = [];
    }
  }
  if (group.length > 0) throw new SpectrumFileError(group[0]!.line, `The last numbers are no whole group of ${size}: the table is not complete.`);
  return points;
}
