import { and, eq, isNull, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { spectra, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";

/** Says that a spectrum does not belong to its stone, and why: it stays in its place, crossed out. Once. */
export async function withdrawSpectrum(ctx: LabContext, { stoneCode, sequence, reason }: { stoneCode: string; sequence: number; reason: string }): Promise<void> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const stone = await stoneUnderExamination(scope, stoneCode);
    const mine = and(eq(spectra.laboratoryId, laboratoryId), eq(spectra.stoneId, stone.id), eq(spectra.sequence, sequence));
    const [found] = await tx.select({ id: spectra.id }).from(spectra).where(mine);
    if (!found) throw new AppError("not_found", "There is no such spectrum.");
    const [result] = await tx.update(spectra).set({ withdrawnAt: now, withdrawnBy: actorId, withdrawnReason: reason }).where(and(mine, isNull(spectra.withdrawnAt)));
    if (result.affectedRows !== 1) throw new AppError("conflict", "This spectrum was withdrawn already; the first reason stands.");
    await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
    await recordAudit(scope, { action: "spectrum.withdrawn", subject: { kind: "stone", id: stone.id }, detail: { sequence }, reason });
  });
}
