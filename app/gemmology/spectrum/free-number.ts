/** A number at the start of a text, as the standard's free format writes it. */
const pattern = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[Ee][+-]\d{1,3})?/;

/**
 * The number that a text begins with, in JCAMP-DX's free numeric format: E is an exponent only with a sign behind it,
 * for without one it is the squeezed digit 5.
 * @returns undefined where it begins with none, or with one too large for a number
 */
export function freeNumber(text: string): { value: number; written: string } | undefined {
  const written = pattern.exec(text)?.[0];
  if (written === undefined) return undefined;
  const value = Number(written);
  return Number.isFinite(value) ? { value, written } : undefined;
}
