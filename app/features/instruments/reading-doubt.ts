import { calendarDateIn, formatCalendarDate } from "#app/domain/calendar-date.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { isMeasuring } from "#app/domain/instrument-scale.ts";

export type ReadingDoubt = Readonly<{ because: "failedAfter" | "overdue" | "neverChecked"; instrument: string; /** A sentence. */ text: string }>;

type Doubted = Readonly<{
  observedAt: Date;
  instrument: Readonly<{ name: string }> | null;
  doubt: Readonly<{ kind: InstrumentKind | null; dueOn: string | null; hasChecks: number; isPassedLater: number; failure: string | null }> | null;
}>;

/**
 * Why the instrument of a reading was not known to be right when it was made. A check passed after it says that it was; a
 * check failed after it calls the reading back, until somebody has answered for it, whatever was passed since.
 */
export function readingDoubt({ observedAt, instrument, doubt }: Doubted, timeZone: string): ReadingDoubt | null {
  if (!instrument || !doubt?.kind) return null;
  const { name } = instrument;
  const day = (instant: Date) => formatCalendarDate(calendarDateIn(instant, timeZone));
  if (doubt.failure) {
    const at = doubt.failure.indexOf(" ");
    return { because: "failedAfter", instrument: name, text: `${name} failed its check with ${doubt.failure.slice(at + 1)} on ${day(new Date(doubt.failure.slice(0, at)))}, after this reading.` };
  }
  if (Number(doubt.isPassedLater)) return null;
  if (doubt.dueOn === null) {
    if (!isMeasuring(doubt.kind) && !Number(doubt.hasChecks)) return null;
    return { because: "neverChecked", instrument: name, text: `${name} had no passed check on record.` };
  }
  return doubt.dueOn < calendarDateIn(observedAt, timeZone) ? { because: "overdue", instrument: name, text: `The check of ${name} was due on ${formatCalendarDate(doubt.dueOn)}.` } : null;
}
