import type { ServiceCode } from "#app/domain/take-in.ts";

export type ListedPrice = Readonly<{ service: ServiceCode; label: string; amountMinor: number; isActive: boolean }>;

/** Stands for one state of the list: differs when anything in it does. */
export function priceListMark(rows: readonly ListedPrice[]): string {
  return [...rows]
    .sort((a, b) => (a.service < b.service ? -1 : 1))
    .map(({ service, label, amountMinor, isActive }) => `${service}:${label}:${amountMinor}:${isActive ? 1 : 0}`)
    .join("|");
}
