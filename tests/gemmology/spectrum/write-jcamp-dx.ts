/** A writer of JCAMP-DX for the tests, from the standard's tables and apart from the reader. */
export type OrdinateForm = "AFFN" | "PAC" | "SQZ" | "SQZDUP" | "DIF" | "DIFDUP";
export const ordinateForms: readonly OrdinateForm[] = ["AFFN", "PAC", "SQZ", "SQZDUP", "DIF", "DIFDUP"];

const squeezed = (value: number) => lead(value, "@ABCDEFGHI", "@abcdefghi");
const difference = (value: number) => lead(value, "%JKLMNOPQR", "%jklmnopqr");
const count = (value: number) => lead(value, " STUVWXYZs", "");

function lead(value: number, positive: string, negative: string): string {
  const digits = String(Math.abs(value));
  return (value < 0 ? negative : positive)[Number(digits[0])]! + digits.slice(1);
}

/** The lines of (X++(Y..Y)), at most 80 characters each, of whole ordinates at whole steps. */
export function ordinateLinesOf(ordinates: readonly number[], form: OrdinateForm, { firstX, step }: { firstX: number; step: number }): string[] {
  const isDifference = form.startsWith("DIF");
  const lines: string[] = [];
  let at = 0;
  while (at < ordinates.length) {
    const repeatsLast = isDifference && at > 0;
    const from = repeatsLast ? at - 1 : at;
    let line = `${firstX + from * step}`;
    const pieces = [form === "AFFN" ? ` ${ordinates[from]}` : form === "PAC" ? signed(ordinates[from]!) : squeezed(ordinates[from]!)];
    let last = pieces[0]!;
    let repeats = 1;
    let next = from + 1;
    const flush = () => {
      if (repeats > 1) pieces.push(count(repeats));
      repeats = 1;
    };
    while (next < ordinates.length && (line + pieces.join("")).length < 66) {
      const value = ordinates[next]!;
      const piece = isDifference ? difference(value - ordinates[next - 1]!) : form === "AFFN" ? ` ${value}` : form === "PAC" ? signed(value) : squeezed(value);
      if (form.endsWith("DUP") && piece === last) repeats++;
      else {
        flush();
        pieces.push(piece);
        last = piece;
      }
      next++;
    }
    flush();
    line += pieces.join("");
    lines.push(line);
    at = next;
  }
  // In differences a last line repeats the last ordinate alone.
  if (isDifference && ordinates.length > 1) lines.push(`${firstX + (ordinates.length - 1) * step}${squeezed(ordinates.at(-1)!)}`);
  return lines;
}

const signed = (value: number) => (value < 0 ? String(value) : `+${value}`);

export type Written = { ordinates: readonly number[]; form: OrdinateForm; firstX: number; step: number; xUnits?: string; yUnits?: string; xFactor?: number; yFactor?: number; more?: readonly string[] };

/** A whole file, with the records that the standard requires. */
export function jcampDxOf({ ordinates, form, firstX, step, xUnits = "NANOMETERS", yUnits = "ABSORBANCE", xFactor = 1, yFactor = 1, more = [] }: Written): string {
  return [
    "##TITLE=An invented spectrum",
    "##JCAMP-DX=4.24",
    "##DATA TYPE=UV/VIS SPECTRUM",
    "##ORIGIN=A test",
    "##OWNER=Nobody",
    `##XUNITS=${xUnits}`,
    `##YUNITS=${yUnits}`,
    `##XFACTOR=${xFactor}`,
    `##YFACTOR=${yFactor}`,
    `##FIRSTX=${firstX * xFactor}`,
    `##LASTX=${(firstX + (ordinates.length - 1) * step) * xFactor}`,
    `##NPOINTS=${ordinates.length}`,
    `##FIRSTY=${ordinates[0]! * yFactor}`,
    ...more,
    "##XYDATA=(X++(Y..Y))",
    ...ordinateLinesOf(ordinates, form, { firstX, step }),
    "##END=",
  ].join("\r\n");
}
