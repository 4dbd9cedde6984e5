/** The middle of a range in which every value is as likely, and its relative standard uncertainty (JCGM 100:2008, 4.3.7). */
export function middleOfRange(least: number, greatest: number): Readonly<{ middle: number; relativeU: number }> {
  const middle = (least + greatest) / 2;
  return { middle, relativeU: (greatest - least) / 2 / Math.sqrt(3) / middle };
}
