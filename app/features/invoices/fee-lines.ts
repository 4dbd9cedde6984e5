import { addMoney } from "#app/domain/money/add-money.ts";
import { money, type CurrencyCode, type Money } from "#app/domain/money/money.ts";
import { taxOf } from "#app/domain/money/tax-of.ts";
import type { ServiceCode } from "#app/domain/take-in.ts";

export type Price = Readonly<{ service: ServiceCode; label: string; amountMinor: number }>;
export type FeeLine = Readonly<{ service: ServiceCode; label: string; quantity: number; unit: Money; net: Money; tax: Money }>;
export type Fee = Readonly<{ lines: readonly FeeLine[]; net: Money; tax: Money; total: Money }>;

/**
 * What the chosen services cost for so many stones: fixed prices times stones, tax rounded half to even once a line.
 * @throws RangeError when a chosen service has no price, or `stoneCount` is not a positive integer
 */
export function feeLines({
  services,
  stoneCount,
  prices,
  taxShareE4,
  currency,
}: {
  services: readonly ServiceCode[];
  stoneCount: number;
  prices: readonly Price[];
  taxShareE4: number;
  currency: CurrencyCode;
}): Fee {
  if (!Number.isSafeInteger(stoneCount) || stoneCount < 1) throw new RangeError(`stoneCount out of range: ${stoneCount}`);
  const lines = services.map((service): FeeLine => {
    const price = prices.find((candidate) => candidate.service === service);
    if (!price) throw new RangeError(`no price for ${service}`);
    const net = money(price.amountMinor * stoneCount, currency);
    return { service, label: price.label, quantity: stoneCount, unit: money(price.amountMinor, currency), net, tax: taxOf(net, taxShareE4 / 10_000) };
  });
  const nothing = money(0, currency);
  const net = lines.reduce((sum, line) => addMoney(sum, line.net), nothing);
  const tax = lines.reduce((sum, line) => addMoney(sum, line.tax), nothing);
  return { lines, net, tax, total: addMoney(net, tax) };
}
