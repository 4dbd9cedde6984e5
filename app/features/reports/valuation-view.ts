import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { certificationPointTexts, marketLevelNames, valueTypeNames } from "#app/domain/valuation.ts";
import type { ValuationView } from "#app/reports/report-view.ts";
import type { ReportMatter } from "./load-report-matter.server.ts";

/** A signed valuation in the words of a report. */
export function valuationView(valuation: NonNullable<ReportMatter["valuation"]>, comparables: ReportMatter["comparables"]): ValuationView {
  const fact = (label: string, value: string) => ({ label, parts: [{ text: value }] });
  return {
    // The reporting option must be named (USPAP Standards Rule 8-2); this product writes the full one.
    option: { name: "Appraisal report", useRestriction: `For ${valuation.intendedUse}, by ${valuation.intendedUsers}; no other use or user is intended.` },
    value: formatMoney({ amountMinor: valuation.amountMinor!, currency: valuation.currency }),
    valueType: valueTypeNames[valuation.valueType],
    valueDefinition: valuation.valueDefinition,
    valueDefinitionSource: valuation.valueDefinitionSource,
    facts: [
      fact("Purpose", valuation.purpose),
      fact("Intended use", valuation.intendedUse),
      fact("Intended users", valuation.intendedUsers),
      fact("Market", `${marketLevelNames[valuation.marketLevel]}, ${valuation.marketPlace}`),
      fact("Effective date", formatCalendarDate(valuation.effectiveOn)),
      fact("Inspection", valuation.inspectedOn ? `${valuation.inspection}, ${formatCalendarDate(valuation.inspectedOn)}` : valuation.inspection),
      fact("Tax", valuation.isTaxIncluded ? "included in the value" : "not included in the value"),
      fact("Approach", "Sales comparison"),
      fact("Earlier services", valuation.priorServices || "None on this property within the three years before this assignment."),
    ],
    reasoning: valuation.approachReasoning,
    otherApproaches: valuation.otherApproachesWhyNot,
    comparables: comparables.map((row) => ({
      reference: `${row.reference}${row.place ? `, ${row.place}` : ""}`,
      description: `${row.description}; ${row.isSold ? "sold" : "asked"}, ${row.isPremiumIncluded ? "premium included" : "without premium"}, ${row.isTaxIncluded ? "tax included" : "without tax"}`,
      onDate: formatCalendarDate(row.onDate),
      price: formatMoney({ amountMinor: row.amountMinor, currency: row.currency }),
      adjustment: [row.exchangeRate === 1 ? "" : `rate ${row.exchangeRate}`, row.adjustmentFactor === 1 ? "" : `× ${row.adjustmentFactor}, ${row.adjustmentReason}`].filter(Boolean).join("; "),
      adjusted: formatMoney({ amountMinor: row.adjustedMinor, currency: valuation.currency }),
    })),
    limitingConditions: valuation.limitingConditions,
    certification: valuation.certification.map((point) => certificationPointTexts[point]),
  };
}
