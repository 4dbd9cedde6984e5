import { Link } from "react-router";
import { StrikeForm } from "./strike-form.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { observationKindNames, readingQualityNames } from "#app/domain/reading.ts";
import type { TimedReading } from "#app/features/readings/present-readings.ts";
import { correctionText, isFigures, readingConditions, readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";

type ReadingsTableProps = {
  readings: readonly TimedReading[];
  /** Empty where nothing may be struck. */
  strikeHref: ((sequence: number) => string) | null;
  canStrike: (reading: TimedReading) => boolean;
  /** Strikes without the line: the page of its own cannot be fetched then. */
  strikeHere?: (sequence: number, reason: string) => Promise<void>;
  /** Readings whose strike waits on this device. */
  strikesWaiting?: ReadonlySet<number>;
};

const noneWaiting: ReadonlySet<number> = new Set();

/** The newest first. A struck reading stays in its place, crossed through, with its reason in its own words. */
export function ReadingsTable({ readings, strikeHref, canStrike, strikeHere, strikesWaiting = noneWaiting }: ReadingsTableProps) {
  if (readings.length === 0) return <EmptyState title="No readings yet">Begin with what harms least: look, weigh, measure, then the polariscope and the refractometer.</EmptyState>;
  return (
    <Table caption="Readings, latest first">
      <thead>
        <tr>
          <HeaderCell>When</HeaderCell>
          <HeaderCell>Test</HeaderCell>
          <HeaderCell>Value</HeaderCell>
          <HeaderCell>Observed</HeaderCell>
          <HeaderCell>
            <span className="sr-only">Strike</span>
          </HeaderCell>
        </tr>
      </thead>
      <tbody>
        {[...readings].reverse().map((reading) => (
          <ReadingRow
            key={reading.sequence}
            reading={reading}
            isStrikeWaiting={strikesWaiting.has(reading.sequence)}
            strikeTo={strikeHref && !reading.strike && !strikesWaiting.has(reading.sequence) && canStrike(reading) ? strikeHref(reading.sequence) : null}
            strikeHere={strikeHere}
          />
        ))}
      </tbody>
    </Table>
  );
}

/** Figures stay on one line, lists of them do not. */
const longestLine = 26;

function ReadingRow({ reading, strikeTo, strikeHere, isStrikeWaiting }: { reading: TimedReading; strikeTo: string | null; strikeHere: ReadingsTableProps["strikeHere"]; isStrikeWaiting: boolean }) {
  const { strike, quality, values } = reading;
  const isStruck = strike !== null;
  const valueText = readingValueText(reading);
  const gap = values.find(({ name }) => name === "birefringence");
  const small = `block text-xs text-ink-3 ${isStruck ? "line-through decoration-red" : ""}`;
  return (
    <tr id={`reading-${reading.sequence}`}>
      <Cell isStruck={isStruck} className="whitespace-nowrap">
        <span title={reading.day}>{reading.when}</span>
        {reading.sentWhen ? <span className={small}>came {reading.sentWhen}</span> : null}
        <span className="hidden text-xs text-ink-3 print:block">{reading.day}</span>
        <span className={small}>
          {initials(reading.observer)} · no. {reading.sequence}
        </span>
      </Cell>
      <Cell isStruck={isStruck}>
        {observationKindNames[reading.detail.kind]}
        <span className={small}>{[readingConditions(reading), reading.instrument?.name].filter(Boolean).join(" · ")}</span>
      </Cell>
      <Cell isStruck={isStruck} className={quality !== "noResult" && isFigures(valueText) ? `font-mono ${valueText.length <= longestLine ? "whitespace-nowrap" : ""}` : ""}>
        {quality === "noResult" ? `no reading: ${reading.noResultReason}` : valueText}
      </Cell>
      <Cell className="min-w-28">
        {strike ? (
          <>
            <span className="text-red">
              Struck {strike.when} by {initials(strike.by)}: {strike.reason}
            </span>
            <span className={small}>{[readingSeenText(reading), reading.note].filter(Boolean).join("; ")}</span>
          </>
        ) : (
          <>
            <span className="break-words whitespace-pre-line">{readingSeenText(reading)}</span>
            {reading.note ? <span className="block break-words whitespace-pre-line text-ink-2">{reading.note}</span> : null}
            {correctionText(values) ? <span className="block text-xs text-ink-3">{correctionText(values)}</span> : null}
            {reading.doubt ? <span className="block text-xs font-medium text-red">Out of check: {reading.doubt.text}</span> : null}
            {quality === "fair" || quality === "poor" ? <span className="block text-xs text-straw">{readingQualityNames[quality]} quality</span> : null}
          </>
        )}
      </Cell>
      <Cell className="text-right">
        <span className="flex flex-wrap items-center justify-end gap-x-3 gap-y-1">
          {reading.isOfSecondCheck ? <Chip tone="blue">check</Chip> : reading.isBlind ? <Chip>before candidates</Chip> : null}
          {gap && !isStruck ? <Chip tone="green">δ {gap.value.toFixed(3)}</Chip> : null}
          {isStrikeWaiting ? <Chip tone="blue">strike waits</Chip> : null}
          {strikeTo && strikeHere ? (
            <StrikeForm onStrike={(reason) => strikeHere(reading.sequence, reason)} />
          ) : strikeTo ? (
            <Link to={strikeTo} className="no-print inline-flex min-h-6 items-center text-xs text-ink-3 underline decoration-rule-2 hover:text-red hover:decoration-red" aria-label={`Strike reading ${reading.sequence}`}>
              Strike
            </Link>
          ) : null}
        </span>
      </Cell>
    </tr>
  );
}

function initials(name: string): string {
  return name.split(/\s+/).map((word) => word[0] ?? "").join("").slice(0, 3).toUpperCase();
}
