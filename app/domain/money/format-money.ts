import { minorDigits, type Money } from "./money.ts";

/** "1 234.50 EUR": thin-space groups, a point, the code behind: unambiguous in print in any country. */
export function formatMoney({ amountMinor, currency }: Money): string {
  return `${formatAmount({ amountMinor, currency })} ${currency}`;
}

export function formatAmount({ amountMinor, currency }: Money): string {
  const digits = minorDigits(currency);
  const sign = amountMinor < 0 ? "−" : "";
  const text = Math.abs(amountMinor).toString().padStart(digits + 1, "0");
  const whole = text.slice(0, text.length - digits).replace(/\B(?=(\d{3})+$)/g, "\u202f");
  return digits === 0 ? `${sign}${whole}` : `${sign}${whole}.${text.slice(-digits)}`;
}
