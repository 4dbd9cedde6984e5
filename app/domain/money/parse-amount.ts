import { minorDigits, type CurrencyCode } from "./money.ts";

/**
 * Reads an amount as typed ("1234.5", "1 234,50") into minor units.
 * @returns undefined when the text is no amount, has more decimals than the currency, or leaves the safe integers
 */
export function parseAmount(text: string, currency: CurrencyCode): number | undefined {
  const compact = text.trim().replace(/[\s\u00a0\u202f']/g, "").replace(",", ".");
  const match = /^(\d{1,13})(?:\.(\d+))?$/.exec(compact);
  if (!match) return undefined;
  const digits = minorDigits(currency);
  const fraction = match[2] ?? "";
  if (fraction.length > digits) return undefined;
  const amountMinor = Number(`${match[1]}${fraction.padEnd(digits, "0")}`);
  return Number.isSafeInteger(amountMinor) ? amountMinor : undefined;
}
