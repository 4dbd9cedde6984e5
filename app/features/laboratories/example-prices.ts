import type { CurrencyCode } from "#app/domain/money/money.ts";
import { minorDigits } from "#app/domain/money/money.ts";
import { serviceNames, type ServiceCode } from "#app/domain/take-in.ts";

/** What a new price list says until the owner has looked it over: round examples, not advice. Fixed amounts only (workflow 1.1). */
export function examplePrices(currency: CurrencyCode): Record<ServiceCode, { label: string; amountMinor: number }> {
  // A currency without a minor unit has units about as small as cents.
  const unit = 10 ** Math.max(2, minorDigits(currency));
  return {
    identification: { label: serviceNames.identification, amountMinor: 80 * unit },
    secondCheck: { label: serviceNames.secondCheck, amountMinor: 30 * unit },
    valuation: { label: serviceNames.valuation, amountMinor: 120 * unit },
  };
}
