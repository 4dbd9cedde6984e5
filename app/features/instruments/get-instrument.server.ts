import { and, desc, eq, sql } from "drizzle-orm";
import { instrumentChecks, instrumentCorrections, instruments, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { usualCheckDays } from "#app/domain/instrument-scale.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { callsBack, isOpen } from "#app/features/recalls/called-back.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";
import { outOfCheck } from "./check-standing.ts";
import { latestFailure } from "./instrument-standing.server.ts";
import { scaleUnitOf } from "./scale-uncertainty.ts";

const checksShown = 100;
const correctionsShown = 20;

/** An instrument with the latest of its checks and corrections, and how it stands. */
export async function getInstrument(ctx: LabContext, instrumentId: InstrumentId) {
  requireRole(ctx, "instruments.read");
  const { db, laboratoryId, laboratory, now } = ctx;
  const its = sql`k.laboratory_id = ${instruments.laboratoryId} and k.instrument_id = ${instruments.id}`;
  const [row] = await db
    .select({
      instrument: instruments,
      failing: sql<string | null>`(select json_arrayagg(k.reference_material) from instrument_checks k where ${its} and ${latestFailure})`,
      passedDueOn: sql<string | null>`(select date_format(k.next_due_on, '%Y-%m-%d') from instrument_checks k where ${its} and k.is_passed order by k.checked_at desc limit 1)`,
      isRecalling: sql<number>`exists (select 1 from instrument_checks k join observations o on ${callsBack} where ${its} and ${isOpen})`,
    })
    .from(instruments)
    .where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.id, instrumentId)));
  if (!row) throw new AppError("not_found", "There is no such instrument.");
  const [checks, corrections] = await Promise.all([
    db
      .select({
        id: instrumentChecks.id,
        referenceMaterial: instrumentChecks.referenceMaterial,
        referenceId: instrumentChecks.referenceMaterialId,
        nominalValue: instrumentChecks.nominalValue,
        readingValue: instrumentChecks.readingValue,
        readingText: instrumentChecks.readingText,
        correctedValue: instrumentChecks.correctedValue,
        limitValue: instrumentChecks.limitValue,
        isPassed: instrumentChecks.isPassed,
        tempC: instrumentChecks.tempC,
        note: instrumentChecks.note,
        nextDueOn: instrumentChecks.nextDueOn,
        checkedAt: instrumentChecks.checkedAt,
        checkedBy: users.name,
      })
      .from(instrumentChecks)
      .innerJoin(users, eq(users.id, instrumentChecks.checkedBy))
      .where(and(eq(instrumentChecks.laboratoryId, laboratoryId), eq(instrumentChecks.instrumentId, instrumentId)))
      .orderBy(desc(instrumentChecks.checkedAt), desc(instrumentChecks.id))
      .limit(checksShown),
    db
      .select({ id: instrumentCorrections.id, correction: instrumentCorrections.correction, reason: instrumentCorrections.reason, fromAt: instrumentCorrections.fromAt, endedAt: instrumentCorrections.endedAt, by: users.name, checkIds: instrumentCorrections.checkIds })
      .from(instrumentCorrections)
      .innerJoin(users, eq(users.id, instrumentCorrections.madeBy))
      .where(and(eq(instrumentCorrections.laboratoryId, laboratoryId), eq(instrumentCorrections.instrumentId, instrumentId)))
      .orderBy(desc(instrumentCorrections.fromAt), desc(instrumentCorrections.id))
      .limit(correctionsShown),
  ]);
  const { laboratoryId: _, ...fields } = row.instrument;
  return {
    ...fields,
    ref: shortRef(fields.id),
    unit: scaleUnitOf(fields),
    usualDays: fields.checkDays ?? usualCheckDays[fields.kind],
    outOfCheck: outOfCheck({ name: fields.name, kind: fields.kind, nextDueOn: row.passedDueOn, failing: [...new Set(parseJsonRows<string>(row.failing))], hasChecks: checks.length > 0 }, calendarDateIn(now, laboratory.timeZone)),
    isRecalling: Boolean(Number(row.isRecalling)),
    checks: checks.map(({ referenceId, ...check }) => ({ ...check, ref: shortRef(check.id), referenceRef: referenceId && shortRef(referenceId) })),
    corrections: corrections.map(({ checkIds, ...one }) => ({ ...one, checkCount: checkIds.length })),
  };
}
