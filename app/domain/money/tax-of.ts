import { money, type Money } from "./money.ts";

/** Tax on one line, rounded half to even once; `taxShare` is 0–1 (0.2 = 20 %). */
export function taxOf(net: Money, taxShare: number): Money {
  if (!(taxShare >= 0 && taxShare <= 1)) throw new RangeError(`taxShare out of range: ${taxShare}`);
  // Shares are kept to four decimals, so integer arithmetic stays exact.
  const product = net.amountMinor * Math.round(taxShare * 10_000);
  const quotient = Math.trunc(product / 10_000);
  const remainder = Math.abs(product - quotient * 10_000);
  const isUp = remainder > 5_000 || (remainder === 5_000 && Math.abs(quotient) % 2 === 1);
  return money(quotient + (isUp ? Math.sign(product) : 0), net.currency);
}
