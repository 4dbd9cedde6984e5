import { sql } from "drizzle-orm";
import { instruments, observations } from "#app/db/schema/index.ts";

const here = sql`k.laboratory_id = ${observations.laboratoryId} and k.instrument_id = ${observations.instrumentId}`;

/**
 * Columns of a query over observations and their instruments, from which `readingDoubt` tells whether an instrument was
 * known to be right. Seeks on one instrument's checks; nothing is read of other instruments.
 */
export const doubtColumns = {
  doubt: {
    kind: instruments.kind,
    /** The day of the next check, of the check that the reading rests on. */
    dueOn: sql<string | null>`(select date_format(k.next_due_on, '%Y-%m-%d') from instrument_checks k where k.laboratory_id = ${observations.laboratoryId} and k.id = ${observations.instrumentCheckId})`,
    hasChecks: sql<number>`exists (select 1 from instrument_checks k where ${here} and k.checked_at <= ${observations.observedAt})`,
    isPassedLater: sql<number>`exists (select 1 from instrument_checks k where ${here} and k.is_passed and k.checked_at > ${observations.observedAt})`,
    /** The latest failure that calls the reading back and was not answered: what it failed on, and when. */
    failure: sql<string | null>`(select concat(date_format(k.checked_at, '%Y-%m-%dT%H:%i:%s.%fZ'), ' ', k.reference_material) from instrument_checks k
      where ${here} and not k.is_passed and k.checked_at >= ${observations.observedAt} and (k.recall_since is null or k.recall_since <= ${observations.observedAt})
        and not exists (select 1 from recall_deeds d where d.laboratory_id = ${observations.laboratoryId} and d.observation_id = ${observations.id} and d.done_at >= k.checked_at)
      order by k.checked_at desc limit 1)`,
  },
} as const;
