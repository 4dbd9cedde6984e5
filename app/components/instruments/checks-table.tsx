import { StateWord } from "#app/components/ui/chip.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import type { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { signed } from "./correction-words.ts";

type Check = Awaited<ReturnType<typeof getInstrument>>["checks"][number];

/** Checks, the latest first: what was shown, what it should have been, and how far off that is. */
export function ChecksTable({ checks, timeZone }: { checks: readonly Check[]; timeZone: string }) {
  return (
    <Table caption="Checks, latest first">
      <thead>
        <tr>
          <HeaderCell>When</HeaderCell>
          <HeaderCell>Reference</HeaderCell>
          <HeaderCell isNumber>Shown</HeaderCell>
          <HeaderCell isNumber>Should be</HeaderCell>
          <HeaderCell isNumber>Off by</HeaderCell>
          <HeaderCell>Outcome</HeaderCell>
          <HeaderCell>Next</HeaderCell>
          <HeaderCell>By</HeaderCell>
        </tr>
      </thead>
      <tbody>
        {checks.map((check) => (
          <tr key={check.id}>
            <Cell className="whitespace-nowrap">{formatInstant(check.checkedAt, timeZone)}</Cell>
            <Cell>
              {check.referenceMaterial}
              {check.tempC === null ? null : <span className="text-ink-3">, {check.tempC} °C</span>}
              {check.note ? <span className="block text-[12.5px] text-ink-3">{check.note}</span> : null}
            </Cell>
            {check.nominalValue === null ? (
              <Cell colSpan={3}>{check.readingText}</Cell>
            ) : (
              <>
                <Cell isNumber>
                  {check.readingText}
                  {check.correctedValue === null ? null : <span className="block text-[12.5px] text-ink-3">corrected {check.correctedValue}</span>}
                </Cell>
                <Cell isNumber>
                  {check.nominalValue} ± {check.limitValue}
                </Cell>
                <Cell isNumber>{deviation(check)}</Cell>
              </>
            )}
            <Cell>
              <StateWord tone={check.isPassed ? "green" : "red"}>{check.isPassed ? "Passed" : "Failed"}</StateWord>
            </Cell>
            <Cell className="whitespace-nowrap">{formatWeekdayDate(check.nextDueOn)}</Cell>
            <Cell>{check.checkedBy}</Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function deviation({ nominalValue, readingValue, correctedValue, readingText }: Check): string {
  const shown = correctedValue ?? readingValue;
  if (nominalValue === null || shown === null) return "";
  const decimals = Math.max(/\.(\d+)/.exec(readingText)?.[1]?.length ?? 0, /\.(\d+)/.exec(String(nominalValue))?.[1]?.length ?? 0) + (correctedValue === null ? 0 : 1);
  return signed(shown - nominalValue, Math.min(6, decimals));
}
