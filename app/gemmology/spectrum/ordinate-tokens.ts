import { freeNumber } from "./free-number.ts";
import { SpectrumFileError } from "./measured-spectrum.ts";

/** One piece of a line of ordinates: a value, a difference to the one before, how often it stands in all, or a value that was not measured. */
export type OrdinateToken = Readonly<{ kind: "value" | "difference" | "count"; number: number } | { kind: "missing" }>;

/** Pseudo-digits: the leading digit with its sign, and what follows it is plain digits. */
const pseudoDigits = { value: "@ABCDEFGHI", negativeValue: " abcdefghi", difference: "%JKLMNOPQR", negativeDifference: " jklmnopqr", count: " STUVWXYZs" } as const;
const meanings = new Map<string, { kind: "value" | "difference" | "count"; sign: 1 | -1; digit: number }>();
for (const [name, digits] of Object.entries(pseudoDigits)) {
  const sign = name.startsWith("negative") ? -1 : 1;
  const kind = name.toLowerCase().endsWith("value") ? "value" : name.toLowerCase().endsWith("difference") ? "difference" : "count";
  [...digits].forEach((character, digit) => character !== " " && meanings.set(character, { kind, sign, digit }));
}

/**
 * The pieces of one line of ordinates in any of the standard's forms, mixed as it allows: free format and PAC (signs as
 * separators), SQZ (the first digit a letter that carries the sign), DIF (a difference) and DUP (a count).
 *
 * Source: McDonald and Wilks (1988), section 5 and table VII.
 * @param text what follows the abscissa
 * @param line for the error
 * @throws SpectrumFileError that shows what it met
 */
export function ordinateTokens(text: string, line: number): OrdinateToken[] {
  const tokens: OrdinateToken[] = [];
  // By itself these letters would be pseudo-digits.
  const word = /(?:^|\s)[+-]?(NaN|Inf(?:inity)?)(?=\s|$)/i.exec(text)?.[1];
  if (word) throw new SpectrumFileError(line, `“${word}” stands here, where an ordinate is needed.`);
  let rest = text;
  for (;;) {
    rest = rest.replace(/^[\s,;]+/, "");
    if (rest === "") return tokens;
    const meaning = meanings.get(rest[0]!);
    if (meaning) {
      const digits = /^\d*(?:\.\d*)?/.exec(rest.slice(1))![0];
      const number = meaning.sign * Number(`${meaning.digit}${digits}`);
      if (!Number.isFinite(number)) throw new SpectrumFileError(line, `“${shown(rest)}” is larger than any ordinate.`);
      tokens.push({ kind: meaning.kind, number });
      rest = rest.slice(1 + digits.length);
    } else if (rest[0] === "?") {
      tokens.push({ kind: "missing" });
      rest = rest.slice(1);
    } else {
      const read = freeNumber(rest);
      if (!read) throw new SpectrumFileError(line, `“${shown(rest)}” is no ordinate in any of JCAMP-DX's forms.`);
      tokens.push({ kind: "value", number: read.value });
      rest = rest.slice(read.written.length);
    }
  }
}

const shown = (text: string) => (text.length > 12 ? `${text.slice(0, 12)}…` : text);
