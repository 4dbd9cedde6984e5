import { and, eq, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instrumentCorrections, instruments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Readings from now on are taken as the instrument shows them. */
export async function endCorrection(ctx: LabContext, instrumentId: InstrumentId, { reason }: { reason: string }): Promise<void> {
  requireRole(ctx, "instruments.manage");
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const [instrument] = await tx.select({ id: instruments.id }).from(instruments).where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.id, instrumentId))).for("update");
    if (!instrument) throw new AppError("not_found", "There is no such instrument.");
    const [ended] = await tx
      .update(instrumentCorrections)
      .set({ endedAt: now, endedBy: actorId })
      .where(and(eq(instrumentCorrections.laboratoryId, laboratoryId), eq(instrumentCorrections.instrumentId, instrumentId), isNull(instrumentCorrections.endedAt)));
    if (ended.affectedRows === 0) throw new AppError("conflict", "No correction is in force on this instrument.");
    await recordAudit({ ...ctx, db: tx }, { action: "instrument.correctionEnded", subject: { kind: "instrument", id: instrumentId }, reason });
  });
}
