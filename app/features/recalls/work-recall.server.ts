import { and, eq, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { observations, recallDeeds, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { Id } from "#app/domain/ids.ts";
import { observationKindNames, type ObservationKind } from "#app/domain/reading.ts";
import type { RecallDeed } from "#app/domain/recall.ts";
import type { ReportState } from "#app/domain/report-state.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";
import { callsBack, isOpen, reliesOn, standsFor } from "./called-back.server.ts";

export type RecallWork = Readonly<{ items: ReadonlyArray<Readonly<{ stoneCode: string; sequence: number }>>; deed: RecallDeed; reason: string }>;

/**
 * Says what was done about readings that were called back, all of them or none. Each deed is looked at: measured again
 * needs that reading, a report withdrawn needs to be withdrawn, and accepting needs its reason.
 */
export async function workRecall(ctx: LabContext, { items, deed, reason }: RecallWork): Promise<void> {
  requireRole(ctx, "instruments.manage");
  const { laboratoryId, actorId, now } = ctx;
  try {
    await inTransaction(ctx.db, async (tx) => {
      const scope = { ...ctx, db: tx };
      for (const item of items) {
        const found = await findCalledBack(scope, item);
        const remeasuredById = requireDone(found, { ...item, deed });
        await tx.insert(recallDeeds).values({ laboratoryId, observationId: found.observationId, failedCheckId: found.checkId, deed, reason, remeasuredById, doneAt: now, doneBy: actorId });
        await recordAudit(scope, { action: "reading.recallSettled", subject: { kind: "stone", id: found.stoneId }, detail: { sequence: item.sequence, deed }, reason });
      }
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    throw wrong("conflict", "items", "Somebody has just answered for one of these readings. Open the list anew.");
  }
}

const id = <Noun extends string>(hex: string) => hex.toLowerCase().replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5") as Id<Noun>;

async function findCalledBack({ db, laboratoryId }: LabContext, { stoneCode, sequence }: RecallWork["items"][number]) {
  const [reading] = await db
    .select({ id: observations.id, stoneId: stones.id, kind: observations.kind })
    .from(stones)
    .innerJoin(observations, and(eq(observations.laboratoryId, stones.laboratoryId), eq(observations.stoneId, stones.id), eq(observations.sequence, sequence)))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
    .for("update");
  if (!reading) throw new AppError("not_found", "There is no such reading.");
  const [rows] = (await db.execute(sql`
    select hex(k.id) checkId,
      (select json_arrayagg(json_object('number', r.number, 'state', r.state)) from reports r where ${reliesOn}) reports,
      (select hex(m.id) from observations m where ${standsFor} order by m.sequence desc limit 1) remeasuredBy
    from observations o join instrument_checks k on ${callsBack}
    where o.laboratory_id = ${sql.param(laboratoryId, observations.laboratoryId)} and o.id = ${sql.param(reading.id, observations.id)} and ${isOpen}
    order by k.checked_at desc limit 1`)) as unknown as [Array<{ checkId: string; reports: string | null; remeasuredBy: string | null }>];
  const [row] = rows;
  if (!row) throw wrong("conflict", "items", `Reading ${sequence} of ${stoneCode} is not on the list any more.`);
  return {
    observationId: reading.id,
    stoneId: reading.stoneId,
    kind: reading.kind as ObservationKind,
    checkId: id<"instrumentCheck">(row.checkId),
    reports: parseJsonRows<{ number: string; state: ReportState }>(row.reports),
    remeasuredById: row.remeasuredBy ? id<"observation">(row.remeasuredBy) : null,
  };
}

/** @returns the later reading that stands in its place, where it was measured again */
function requireDone({ kind, reports, remeasuredById }: Awaited<ReturnType<typeof findCalledBack>>, { stoneCode, sequence, deed }: RecallWork["items"][number] & { deed: RecallDeed }) {
  if (deed === "remeasured") {
    if (!remeasuredById) throw wrong("invalid_input", "deed", `No later ${observationKindNames[kind].toLowerCase()} reading of ${stoneCode} stands in the place of reading ${sequence}: measure it again on an instrument in check first.`);
    return remeasuredById;
  }
  if (deed === "reportWithdrawn") {
    const standing = reports.filter(({ state }) => state === "authorised" || state === "issued");
    if (standing.length > 0) throw wrong("invalid_input", "deed", `${standing.map(({ number }) => number).join(", ")} still stands: an owner withdraws it on its own page first.`);
    if (!reports.some(({ state }) => state === "withdrawn")) throw wrong("invalid_input", "deed", `No report that relies on reading ${sequence} of ${stoneCode} was withdrawn.`);
  }
  return null;
}

function wrong(code: "conflict" | "invalid_input", field: string, message: string): AppError {
  return new AppError(code, message, { fieldErrors: { [field]: [message] } });
}
