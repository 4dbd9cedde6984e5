import { formatAmount } from "#app/domain/money/format-money.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { getValuation } from "./get-valuation.server.ts";

type Found = Awaited<ReturnType<typeof getValuation>>;

/** What the form of a valuation starts with, as text: the draft that is there, or an empty one. */
export function valuationDefaults({ valuation, comparables, today, currency }: Pick<Found, "valuation" | "comparables"> & { today: string; currency: CurrencyCode }) {
  const draft = valuation?.state === "draft" ? valuation : null;
  const plainAmount = (amountMinor: number, code: CurrencyCode) => formatAmount({ amountMinor, currency: code }).replaceAll("\u202f", "");
  const tick = (isTicked: boolean) => (isTicked ? "on" : "");
  return {
    rowVersion: draft?.rowVersion ?? 0,
    purpose: draft?.purpose ?? "",
    intendedUse: draft?.intendedUse ?? "",
    intendedUsers: draft?.intendedUsers ?? "",
    valueType: draft?.valueType ?? "",
    valueDefinition: draft?.valueDefinition ?? "",
    valueDefinitionSource: draft?.valueDefinitionSource ?? "",
    marketLevel: draft?.marketLevel ?? "",
    marketPlace: draft?.marketPlace ?? "",
    inspection: draft?.inspection ?? "",
    inspectedOn: draft?.inspectedOn ?? "",
    effectiveOn: draft?.effectiveOn ?? today,
    currency: draft?.currency ?? currency,
    amount: draft?.amountMinor ? plainAmount(draft.amountMinor, draft.currency) : "",
    isTaxIncluded: tick(draft?.isTaxIncluded ?? false),
    approachReasoning: draft?.approachReasoning ?? "",
    otherApproachesWhyNot: draft?.otherApproachesWhyNot ?? "",
    limitingConditions: (draft?.limitingConditions ?? []).join("\n"),
    certification: [...(draft?.certification ?? [])] as string[],
    priorServices: draft?.priorServices ?? "",
    comparables: (draft ? comparables : []).map((row) => ({
      kind: row.kind as string,
      reference: row.reference,
      onDate: row.onDate,
      place: row.place,
      description: row.description,
      amount: plainAmount(row.amountMinor, row.currency),
      currency: row.currency as string,
      exchangeRate: String(row.exchangeRate),
      isPremiumIncluded: tick(row.isPremiumIncluded),
      isTaxIncluded: tick(row.isTaxIncluded),
      isSold: tick(row.isSold),
      adjustmentFactor: String(row.adjustmentFactor),
      adjustmentReason: row.adjustmentReason,
    })),
  };
}
