import { freeNumber } from "./free-number.ts";
import type { ValueLine } from "./labelled-records.ts";
import { SpectrumFileError } from "./measured-spectrum.ts";
import { ordinateTokens } from "./ordinate-tokens.ts";
import { mostSpectrumPoints } from "./spectrum-limits.ts";

export type AbscissaCheck = Readonly<{
  line: number;
  x: number;
  /** One unit of the last digit that was written. */
  resolution: number;
  /** Which ordinate stands first on the line, 0 for the first of all. */
  at: number;
  /** The line repeats the ordinate before as a check. */
  isRepeat: boolean;
}>;
export type OrdinateLines = Readonly<{
  /** As written, before any factor; null where the file says that it was not measured. */
  ordinates: readonly (number | null)[];
  abscissae: readonly AbscissaCheck[];
  /** Whether every line in difference form is followed by the check of its last ordinate. */
  isChecked: boolean;
}>;

/**
 * The lines of a table in the form (X++(Y..Y)): an abscissa, then ordinates at equal steps. After a line that ends in
 * differences the next one begins by repeating its last ordinate, so that a lost digit shows.
 *
 * Source: McDonald and Wilks (1988), sections 5.8 and 6.4.1.
 * @throws SpectrumFileError that names the line
 */
export function ordinateLines(lines: readonly ValueLine[]): OrdinateLines {
  const ordinates: (number | null)[] = [];
  const abscissae: AbscissaCheck[] = [];
  let awaited: number | null = null;

  for (const { line, text } of lines) {
    const trimmed = text.trim();
    const abscissa = freeNumber(trimmed);
    if (!abscissa) throw new SpectrumFileError(line, `A line of data begins with its abscissa, a number; this one begins with “${trimmed.slice(0, 12)}”.`);
    const tokens = ordinateTokens(trimmed.slice(abscissa.written.length), line);
    if (tokens.length === 0) throw new SpectrumFileError(line, "There is an abscissa here, but no ordinate.");

    const isRepeat = awaited !== null;
    abscissae.push({ line, x: abscissa.value, resolution: resolutionOf(abscissa.written), at: ordinates.length - (isRepeat ? 1 : 0), isRepeat });
    let last: { kind: "value" | "difference" | "missing"; number: number } | undefined;
    tokens.forEach((token, at) => {
      if (token.kind === "count") {
        if (!last || tokens[at - 1]!.kind === "count") throw new SpectrumFileError(line, "A count of duplicates stands here without the value that it repeats.");
        if (!Number.isInteger(token.number) || token.number < 1) throw new SpectrumFileError(line, `A value is repeated a whole number of times, not ${token.number}.`);
        if (ordinates.length + token.number > mostSpectrumPoints) throw tooMany(line);
        for (let repeat = 1; repeat < token.number; repeat++) ordinates.push(last.kind === "missing" ? null : last.kind === "value" ? last.number : ordinates.at(-1)! + last.number);
        return;
      }
      if (token.kind === "difference") {
        // The check itself is a value, so a difference at the start of a line has nothing to differ from.
        const before: number | null | undefined = at === 0 ? undefined : ordinates.at(-1);
        if (before === undefined || before === null) throw new SpectrumFileError(line, "A difference stands here without a value before it.");
        ordinates.push(before + token.number);
      } else if (at === 0 && awaited !== null) {
        if (token.kind === "missing" || !isClose(token.number, awaited)) {
          throw new SpectrumFileError(line, `This line should begin by repeating the last ordinate before it, ${awaited}, but says ${token.kind === "missing" ? "?" : token.number}: a digit was lost on the way.`);
        }
      } else ordinates.push(token.kind === "missing" ? null : token.number);
      last = { kind: token.kind, number: token.kind === "missing" ? 0 : token.number };
      if (ordinates.length > mostSpectrumPoints) throw tooMany(line);
    });
    awaited = last?.kind === "difference" ? ordinates.at(-1)! : null;
  }
  return { ordinates, abscissae, isChecked: awaited === null };
}

function resolutionOf(written: string): number {
  const [, decimals = "", exponent = "0"] = /^[+-]?\d*\.?(\d*)(?:[Ee]([+-]\d+))?$/.exec(written) ?? [];
  return 10 ** (Number(exponent) - (written.includes(".") ? decimals.length : 0));
}

const isClose = (one: number, other: number) => Math.abs(one - other) <= 1e-6 * Math.max(1, Math.abs(one), Math.abs(other));
const tooMany = (line: number) => new SpectrumFileError(line, `There are more than ${mostSpectrumPoints.toLocaleString("en")} points here. Save the spectrum at a wider step.`);
