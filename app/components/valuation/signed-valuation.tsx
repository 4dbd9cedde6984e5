import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatCalendarDate, formatInstant } from "#app/domain/calendar-date.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { certificationPointTexts, marketLevelNames, valueTypeNames } from "#app/domain/valuation.ts";
import type { getValuation } from "#app/features/valuations/get-valuation.server.ts";

type Found = Awaited<ReturnType<typeof getValuation>>;
type SignedProps = { valuation: NonNullable<Found["valuation"]>; comparables: Found["comparables"]; signedByName: string | null; afterSigning: Found["afterSigning"]; timeZone: string };

/** A signed valuation, to read. It is not changed any more: a new one is a new version. */
export function SignedValuation({ valuation, comparables, signedByName, afterSigning, timeZone }: SignedProps) {
  return (
    <>
      <Card title={valuation.amountMinor === null ? "" : formatMoney({ amountMinor: valuation.amountMinor, currency: valuation.currency })} note={valueTypeNames[valuation.valueType]}>
        <CardBody className="grid gap-4">
          <Facts
            rows={[
              { name: "Purpose", value: valuation.purpose },
              { name: "Intended use", value: valuation.intendedUse },
              { name: "Intended users", value: valuation.intendedUsers },
              { name: "Definition", value: `${valuation.valueDefinition} (${valuation.valueDefinitionSource})` },
              { name: "Market", value: `${marketLevelNames[valuation.marketLevel]}, ${valuation.marketPlace}` },
              { name: "Effective date", value: formatCalendarDate(valuation.effectiveOn) },
              { name: "Inspection", value: `${valuation.inspection}${valuation.inspectedOn ? `, ${formatCalendarDate(valuation.inspectedOn)}` : ""}` },
              { name: "Signed", value: valuation.signedAt ? `${signedByName}, ${formatInstant(valuation.signedAt, timeZone)}` : null },
              { name: "Reasoning", value: valuation.approachReasoning },
              { name: "Other approaches", value: valuation.otherApproachesWhyNot },
              { name: "Conditions", value: valuation.limitingConditions.join(" ") },
              { name: "Declared at take-in", value: afterSigning ? (afterSigning.declaredValue ?? "Nothing was declared") : null },
              { name: "Fee", value: afterSigning?.fee ?? null },
            ]}
          />
          <ul className="grid list-disc gap-1 pl-5 text-ink-2">
            {valuation.certification.map((point) => (
              <li key={point}>{certificationPointTexts[point]}</li>
            ))}
          </ul>
        </CardBody>
      </Card>
      <Card title="Comparables">
        <Table caption="Comparables of the valuation">
          <thead>
            <tr>
              <HeaderCell>Reference</HeaderCell>
              <HeaderCell>Description</HeaderCell>
              <HeaderCell>Date</HeaderCell>
              <HeaderCell isNumber>Price</HeaderCell>
              <HeaderCell isNumber>Adjusted</HeaderCell>
            </tr>
          </thead>
          <tbody>
            {comparables.map((row) => (
              <tr key={row.position}>
                <Cell>{row.reference}</Cell>
                <Cell>{row.description}</Cell>
                <Cell className="whitespace-nowrap">{formatCalendarDate(row.onDate)}</Cell>
                <Cell isNumber>{formatMoney({ amountMinor: row.amountMinor, currency: row.currency })}</Cell>
                <Cell isNumber>{formatMoney({ amountMinor: row.adjustedMinor, currency: valuation.currency })}</Cell>
              </tr>
            ))}
          </tbody>
        </Table>
      </Card>
    </>
  );
}
