import { money, type Money } from "./money.ts";

/** @throws RangeError when the currencies differ or the sum leaves the safe integers */
export function addMoney(a: Money, b: Money): Money {
  if (a.currency !== b.currency) throw new RangeError(`cannot add ${b.currency} to ${a.currency}`);
  return money(a.amountMinor + b.amountMinor, a.currency);
}
