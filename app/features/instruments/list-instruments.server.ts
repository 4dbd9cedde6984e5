import { and, asc, eq, sql } from "drizzle-orm";
import { instrumentChecks, instruments } from "#app/db/schema/index.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** All instruments by name, each with its latest check. A laboratory has dozens, so the list has no pages. */
export async function listInstruments(ctx: LabContext) {
  requireRole(ctx, "instruments.read");
  const rows = await instrumentsWithLastCheck(ctx, undefined);
  return rows.map((row) => ({ ...row, ref: shortRef(row.id) }));
}

export type InstrumentListItem = Awaited<ReturnType<typeof listInstruments>>[number];

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
