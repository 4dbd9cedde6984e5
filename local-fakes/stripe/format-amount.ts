/** An amount in the currency's smallest unit, as a payer reads it. */
export function formatAmount(amountMinor: number, currency: string): string {
  const format = new Intl.NumberFormat("en-GB", { style: "currency", currency: currency.toUpperCase(), currencyDisplay: "code" });
  return format.format(amountMinor / 10 ** (format.resolvedOptions().maximumFractionDigits ?? 2));
}
