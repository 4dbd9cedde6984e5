import { and, asc, eq, sql } from "drizzle-orm";
import { instrumentChecks, instruments } from "#app/db/schema/index.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext, LabScope } from "#app/features/lab-context.ts";
import { callsBack, isOpen } from "#app/features/recalls/called-back.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";
import { outOfCheck } from "./check-standing.ts";
import { latestFailure } from "./instrument-standing.server.ts";

/** All instruments by name, each with its latest check and how it stands. A laboratory has dozens, so the list has no pages. */
export async function listInstruments(ctx: LabContext) {
  requireRole(ctx, "instruments.read");
  const rows = await instrumentsWithLastCheck(ctx, undefined);
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  return rows.map(({ failing, passedDueOn, isCorrected, isRecalling, ...row }) => ({
    ...row,
    ref: shortRef(row.id),
    outOfCheck: outOfCheck({ name: row.name, kind: row.kind, nextDueOn: passedDueOn, failing: [...new Set(parseJsonRows<string>(failing))], hasChecks: row.lastCheckedAt !== null }, today),
    isCorrected: Boolean(Number(isCorrected)),
    /** Readings of it were called back, and nobody has answered for all of them. */
    isRecalling: Boolean(Number(isRecalling)),
  }));
}

export type InstrumentListItem = Awaited<ReturnType<typeof listInstruments>>[number];

const its = sql`k.laboratory_id = ${instruments.laboratoryId} and k.instrument_id = ${instruments.id}`;

export function instrumentsWithLastCheck(scope: Pick<LabScope, "db" | "laboratoryId">, kind: "balance" | undefined) {
  return scope.db
    .select({
      id: instruments.id,
      kind: instruments.kind,
      name: instruments.name,
      description: instruments.description,
      serial: instruments.serial,
      location: instruments.location,
      status: instruments.status,
      statusReason: instruments.statusReason,
      resolution: instruments.resolution,
      standardUncertainty: instruments.standardUncertainty,
      lastCheckedAt: instrumentChecks.checkedAt,
      isLastCheckPassed: instrumentChecks.isPassed,
      nextDueOn: instrumentChecks.nextDueOn,
      passedDueOn: sql<string | null>`(select date_format(k.next_due_on, '%Y-%m-%d') from instrument_checks k where ${its} and k.is_passed order by k.checked_at desc limit 1)`,
      failing: sql<string | null>`(select json_arrayagg(k.reference_material) from instrument_checks k where ${its} and ${latestFailure})`,
      isCorrected: sql<number>`exists (select 1 from instrument_corrections c where c.laboratory_id = ${instruments.laboratoryId} and c.instrument_id = ${instruments.id} and c.ended_at is null)`,
      isRecalling: sql<number>`exists (select 1 from instrument_checks k join observations o on ${callsBack} where ${its} and ${isOpen})`,
    })
    .from(instruments)
    .leftJoin(
      instrumentChecks,
      and(
        eq(instrumentChecks.laboratoryId, instruments.laboratoryId),
        eq(
          instrumentChecks.id,
          sql`(select latest.id from instrument_checks latest where latest.laboratory_id = ${instruments.laboratoryId} and latest.instrument_id = ${instruments.id} order by latest.checked_at desc, latest.id desc limit 1)`,
        ),
      ),
    )
    .where(and(eq(instruments.laboratoryId, scope.laboratoryId), kind && eq(instruments.kind, kind)))
    .orderBy(asc(instruments.name));
}
