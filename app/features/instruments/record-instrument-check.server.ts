import { and, eq, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instrumentChecks, instruments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { isWithinLimit } from "./is-within-limit.ts";
import type { InstrumentCheckInput } from "./instrument-forms.server.ts";

/**
 * A reading of a reference, judged by its limit. A check that fails takes the instrument out of service at once; putting
 * it back is a person's decision, with another check before it.
 *
 * @returns whether it passed
 */
export async function recordInstrumentCheck(ctx: LabContext, instrumentId: InstrumentId, input: InstrumentCheckInput): Promise<{ isPassed: boolean }> {
  requireRole(ctx, "instruments.manage");
  const { requestId, referenceMaterial, nominal, reading, limit, tempC, nextDueOn, note } = input;
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  if (nextDueOn <= today) {
    const message = "The next check is after today.";
    throw new AppError("invalid_input", message, { fieldErrors: { nextDueOn: [message] } });
  }
  const isPassed = isWithinLimit({ nominal: nominal.value, reading: reading.value, limit: limit.value });
  try {
    await inTransaction(ctx.db, async (tx) => {
      const mine = and(eq(instruments.laboratoryId, ctx.laboratoryId), eq(instruments.id, instrumentId));
      const [instrument] = await tx.select({ status: instruments.status }).from(instruments).where(mine).for("update");
      if (!instrument) throw new AppError("not_found", "There is no such instrument.");
      await tx.insert(instrumentChecks).values({
        laboratoryId: ctx.laboratoryId,
        id: requestId,
        instrumentId,
        referenceMaterial,
        nominalValue: nominal.value,
        readingValue: reading.value,
        readingText: reading.text,
        limitValue: limit.value,
        isPassed,
        tempC,
        note,
        nextDueOn,
        checkedAt: ctx.now,
        checkedBy: ctx.actorId,
      });
      if (!isPassed && instrument.status !== "outOfService") {
        await tx
          .update(instruments)
          .set({ status: "outOfService", statusReason: `Failed its check with ${referenceMaterial}`.slice(0, 300), version: sql`${instruments.version} + 1` })
          .where(mine);
      }
      await recordAudit({ ...ctx, db: tx }, { action: "instrument.checked", subject: { kind: "instrument", id: instrumentId }, detail: { isPassed } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db
      .select({ isPassed: instrumentChecks.isPassed })
      .from(instrumentChecks)
      .where(and(eq(instrumentChecks.laboratoryId, ctx.laboratoryId), eq(instrumentChecks.id, requestId)));
    if (!made) throw error;
    return made;
  }
  return { isPassed };
}
