import { and, eq, isNull } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instrumentCorrections, instruments } from "#app/db/schema/index.ts";
import type { InstrumentCorrectionId, InstrumentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { findCalibration, type CalibrationChoice } from "./find-calibration.server.ts";

/**
 * From now on what the checks give is added to every reading of the instrument; readings made before stay as they are.
 * It takes the place of the one that was in force.
 *
 * @param input.requestId becomes the correction's id, so that a form sent twice starts one
 */
export async function startCorrection(ctx: LabContext, instrumentId: InstrumentId, { requestId, reason, ...choice }: CalibrationChoice & { requestId: InstrumentCorrectionId; reason: string }): Promise<void> {
  requireRole(ctx, "instruments.manage");
  const { laboratoryId, actorId, now } = ctx;
  try {
    await inTransaction(ctx.db, async (tx) => {
      const scope = { ...ctx, db: tx };
      await tx.select({ id: instruments.id }).from(instruments).where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.id, instrumentId))).for("update");
      const { fitted } = await findCalibration(scope, instrumentId, choice);
      await tx
        .update(instrumentCorrections)
        .set({ endedAt: now, endedBy: actorId })
        .where(and(eq(instrumentCorrections.laboratoryId, laboratoryId), eq(instrumentCorrections.instrumentId, instrumentId), isNull(instrumentCorrections.endedAt)));
      await tx.insert(instrumentCorrections).values({ laboratoryId, id: requestId, instrumentId, correction: fitted.correction, checkIds: [...choice.checkIds], reason, fromAt: now, madeBy: actorId });
      await recordAudit(scope, { action: "instrument.correctionStarted", subject: { kind: "instrument", id: instrumentId }, detail: { ...fitted.correction }, reason });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db
      .select({ id: instrumentCorrections.id })
      .from(instrumentCorrections)
      .where(and(eq(instrumentCorrections.laboratoryId, laboratoryId), eq(instrumentCorrections.instrumentId, instrumentId), eq(instrumentCorrections.id, requestId)));
    if (!made) throw error;
  }
}
