import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { isMeasuring } from "#app/domain/instrument-scale.ts";

type Checked = Readonly<{
  name: string;
  kind: InstrumentKind;
  /** Of its last passed check; null where it never passed one. */
  nextDueOn: string | null;
  /** References that its latest check with them failed on. */
  failing: readonly string[];
  /** It had a check at all. */
  hasChecks: boolean;
}>;

/** Why an instrument is out of check, in a sentence; null where it is in check, or its kind needs none and it had none. */
export function outOfCheck({ name, kind, nextDueOn, failing, hasChecks }: Checked, today: string): string | null {
  if (failing.length > 0) return `${name} failed its last check with ${failing.join(" and ")}.`;
  if (nextDueOn === null) return isMeasuring(kind) || hasChecks ? `${name} has no passed check on record.` : null;
  return nextDueOn < today ? `The check of ${name} was due on ${formatCalendarDate(nextDueOn)}.` : null;
}
