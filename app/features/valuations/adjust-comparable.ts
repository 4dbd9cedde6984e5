import { minorDigits, money, type CurrencyCode, type Money } from "#app/domain/money/money.ts";

/**
 * A comparable's price brought to the valuation's currency and adjusted: price × rate × factor, rounded half to even once.
 *
 * @param exchangeRate units of `currency` for one unit of the price's currency, > 0; 1 when they are the same
 * @param adjustmentFactor dimensionless, > 0; 1 leaves the price as it is
 * @throws RangeError when a factor is not positive or the result leaves the safe integers
 */
export function adjustComparable({
  price,
  currency,
  exchangeRate,
  adjustmentFactor,
}: {
  price: Money;
  currency: CurrencyCode;
  exchangeRate: number;
  adjustmentFactor: number;
}): Money {
  if (!(exchangeRate > 0) || !Number.isFinite(exchangeRate)) throw new RangeError(`exchangeRate out of range: ${exchangeRate}`);
  if (!(adjustmentFactor > 0) || !Number.isFinite(adjustmentFactor)) throw new RangeError(`adjustmentFactor out of range: ${adjustmentFactor}`);
  const scale = 10 ** (minorDigits(currency) - minorDigits(price.currency));
  return money(roundHalfEven(price.amountMinor * exchangeRate * adjustmentFactor * scale), currency);
}

function roundHalfEven(value: number): number {
  const floor = Math.floor(value);
  const fraction = value - floor;
  if (Math.abs(fraction - 0.5) > 1e-9) return Math.round(value);
  return floor % 2 === 0 ? floor : floor + 1;
}
