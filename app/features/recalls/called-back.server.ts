import { sql } from "drizzle-orm";

/*
 * Pieces of SQL over the aliases `o` (a row of observations) and `k` (a row of instrument_checks). Both sides seek: one
 * instrument's checks by instrument_checks_instrument, its readings by observations_instrument.
 */

/** The failed check k calls the reading o back: made before it, and after the last check that said something of the time. */
export const callsBack = sql`k.laboratory_id = o.laboratory_id and k.instrument_id = o.instrument_id and not k.is_passed and o.observed_at <= k.checked_at
  and (k.recall_since is null or o.observed_at >= k.recall_since) and o.quality <> 'noResult'`;

/** Nobody has answered for it yet, and it was not struck before the check failed. */
export const isOpen = sql`not exists (select 1 from recall_deeds d where d.laboratory_id = o.laboratory_id and d.observation_id = o.id and d.done_at >= k.checked_at)
  and not exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id and s.struck_at <= k.checked_at)`;

/** A report r of the stone was frozen with the reading o in it. */
export const reliesOn = sql`r.laboratory_id = o.laboratory_id and r.stone_id = o.stone_id and r.authorised_at >= o.recorded_at
  and not exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id and s.struck_at <= r.authorised_at)`;

/** The reading m stands in the place of the reading o: of the same kind, made after the check k failed, not struck, and not called back itself. */
export const standsFor = sql`m.laboratory_id = o.laboratory_id and m.stone_id = o.stone_id and m.kind = o.kind and m.observed_at > k.checked_at and m.quality <> 'noResult'
  and not exists (select 1 from observation_strikes s where s.laboratory_id = m.laboratory_id and s.observation_id = m.id)
  and not exists (select 1 from instrument_checks f where f.laboratory_id = m.laboratory_id and f.instrument_id = m.instrument_id and not f.is_passed and f.checked_at >= m.observed_at)`;
