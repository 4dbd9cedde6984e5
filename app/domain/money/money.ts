export const currencyCodes = ["EUR", "USD", "GBP", "CHF", "CAD", "AUD", "NZD", "JPY", "SEK", "NOK", "DKK", "PLN", "CZK", "HKD", "SGD", "THB", "INR", "ZAR", "KWD"] as const;
export type CurrencyCode = (typeof currencyCodes)[number];

/** An amount in the currency's minor unit: a safe integer, never a float of euros. */
export type Money = Readonly<{ amountMinor: number; currency: CurrencyCode }>;

/** Decimals of the minor unit by ISO 4217. */
export function minorDigits(currency: CurrencyCode): number {
  if (currency === "JPY") return 0;
  if (currency === "KWD") return 3;
  return 2;
}

export function money(amountMinor: number, currency: CurrencyCode): Money {
  if (!Number.isSafeInteger(amountMinor)) throw new RangeError(`amountMinor is not a safe integer: ${amountMinor}`);
  return { amountMinor, currency };
}
