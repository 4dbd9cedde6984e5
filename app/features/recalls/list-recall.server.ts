import { sql, type SQL } from "drizzle-orm";
import { observations } from "#app/db/schema/index.ts";
import type { ObservationKind } from "#app/domain/reading.ts";
import { mostRecalled, type RecallDeed } from "#app/domain/recall.ts";
import type { ReportState } from "#app/domain/report-state.ts";
import type { ExaminationState } from "#app/domain/stone-state.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";
import { callsBack, isOpen, reliesOn, standsFor } from "./called-back.server.ts";

export type RecalledReading = Readonly<{
  stoneCode: string;
  description: string;
  stoneState: ExaminationState;
  sequence: number;
  kind: ObservationKind;
  /** The digits as typed; empty while a second check of the stone is not compared, so that nobody reads ahead. */
  shown: string;
  observedAt: Date;
  observer: string;
  instrument: string;
  failedOn: string;
  failedAt: Date;
  isStruck: boolean;
  reports: ReadonlyArray<Readonly<{ number: string; state: ReportState }>>;
  /** Later readings that stand in its place. */
  remeasured: readonly number[];
  done: Readonly<{ deed: RecallDeed; reason: string; at: Date; by: string }> | null;
}>;

type Row = Omit<RecalledReading, "reports" | "remeasured" | "isStruck" | "observedAt" | "failedAt" | "done"> & {
  id: string; observedAt: string; failedAt: string; isStruck: number; reports: string | null; remeasured: string | null; deed: RecallDeed | null; reason: string | null; doneAt: string | null; doneBy: string | null;
};

/**
 * Readings whose instrument failed a check after them: those that nobody has answered for yet, the oldest failure first;
 * or what was done, the latest first. Struck ones stay on the list, marked, unless they were struck before the failure.
 */
export async function listRecall(ctx: LabContext, { show = "open" }: { show?: "open" | "done" } = {}): Promise<RecalledReading[]> {
  requireRole(ctx, "readings.read");
  const laboratory = sql.param(ctx.laboratoryId, observations.laboratoryId);
  const which: SQL =
    show === "open"
      ? sql`instrument_checks k join observations o on ${callsBack} left join recall_deeds a on false where k.laboratory_id = ${laboratory} and ${isOpen} order by k.checked_at, o.observed_at, o.id`
      : sql`recall_deeds a join instrument_checks k on k.laboratory_id = a.laboratory_id and k.id = a.failed_check_id join observations o on o.laboratory_id = a.laboratory_id and o.id = a.observation_id
          where a.laboratory_id = ${laboratory} order by a.done_at desc, o.id`;
  const [rows] = (await ctx.db.execute(sql`
    select hex(o.id) id, t.code stoneCode, t.description, t.examination_state stoneState, o.sequence, o.kind, u.name observer, i.name instrument, k.reference_material failedOn,
      date_format(o.observed_at, '%Y-%m-%dT%H:%i:%s.%fZ') observedAt, date_format(k.checked_at, '%Y-%m-%dT%H:%i:%s.%fZ') failedAt,
      exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id) isStruck,
      if(t.examination_state = 'concluded', '', coalesce((select group_concat(v.typed_text order by v.value separator ' · ') from observation_values v where v.laboratory_id = o.laboratory_id and v.observation_id = o.id and v.formula is null), '')) shown,
      (select json_arrayagg(json_object('number', r.number, 'state', r.state) order by r.version) from reports r where ${reliesOn}) reports,
      (select json_arrayagg(m.sequence order by m.sequence) from observations m where ${standsFor}) remeasured,
      a.deed, a.reason, date_format(a.done_at, '%Y-%m-%dT%H:%i:%s.%fZ') doneAt, (select p.name from users p where p.id = a.done_by) doneBy
    from (select k.laboratory_id lab, k.id check_id, o.id observation_id, a.deed, a.reason, a.done_at, a.done_by from ${which} limit ${mostRecalled + 1}) a
    join instrument_checks k on k.laboratory_id = a.lab and k.id = a.check_id
    join observations o on o.laboratory_id = a.lab and o.id = a.observation_id
    join stones t on t.laboratory_id = o.laboratory_id and t.id = o.stone_id
    join instruments i on i.laboratory_id = o.laboratory_id and i.id = o.instrument_id
    join users u on u.id = o.observer_id
    order by ${show === "open" ? sql`k.checked_at, o.observed_at, o.id` : sql`a.done_at desc, o.id`}`)) as unknown as [Row[]];
  // A reading that several checks call back is one thing to do: its latest failure tells of it.
  const byReading = new Map<string, Row>();
  for (const row of rows) byReading.set(show === "open" ? row.id : `${row.id} ${row.doneAt}`, row);
  return [...byReading.values()].map(({ id: _, observedAt, failedAt, isStruck, reports, remeasured, deed, reason, doneAt, doneBy, ...row }) => ({
    ...row,
    sequence: Number(row.sequence),
    observedAt: new Date(observedAt),
    failedAt: new Date(failedAt),
    isStruck: Boolean(Number(isStruck)),
    reports: parseJsonRows<RecalledReading["reports"][number]>(reports),
    remeasured: parseJsonRows<number>(remeasured),
    done: deed && doneAt ? { deed, reason: reason ?? "", at: new Date(doneAt), by: doneBy ?? "" } : null,
  }));
}
