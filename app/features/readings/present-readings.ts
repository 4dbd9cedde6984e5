import { formatInstant } from "#app/domain/calendar-date.ts";
import type { ReadingView } from "./reading-view.ts";

const noWaitMs = 60_000;
export type TimedReading = ReturnType<typeof presentReadings>[number];

/** Readings with their instants as the laboratory's clock shows them. */
export function presentReadings(readings: readonly ReadingView[], timeZone: string) {
  return readings.map(({ observedAt, recordedAt, check, strike, ...reading }) => ({
    ...reading,
    ...clock(observedAt, timeZone),
    /** When it came here, where it waited on a device; null where it did not. */
    sentWhen: recordedAt.getTime() - observedAt.getTime() > noWaitMs ? clock(recordedAt, timeZone).when : null,
    check: check && { referenceMaterial: check.referenceMaterial },
    strike: strike && { reason: strike.reason, by: strike.by, when: clock(strike.struckAt, timeZone).when },
  }));
}

function clock(instant: Date, timeZone: string): { when: string; day: string } {
  const text = formatInstant(instant, timeZone);
  const [day, when] = text.split(", ") as [string, string];
  return { when, day };
}
