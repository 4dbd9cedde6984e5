import { and, eq, isNull, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { inclusions, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";

/** Strikes an inclusion through: it stays legible, with who, when and why. Once; by the examiner or whoever recorded it. */
export async function strikeInclusion(ctx: LabContext, { stoneCode, sequence, reason }: { stoneCode: string; sequence: number; reason: string }): Promise<void> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const stone = await stoneUnderExamination(scope, stoneCode);
    const mine = and(eq(inclusions.laboratoryId, laboratoryId), eq(inclusions.stoneId, stone.id), eq(inclusions.sequence, sequence));
    const [found] = await tx.select({ observerId: inclusions.observerId }).from(inclusions).where(mine);
    if (!found) throw new AppError("not_found", "There is no such inclusion.");
    if (found.observerId !== actorId && stone.examinerId !== actorId) throw new AppError("forbidden", "Only the examiner of this stone or whoever recorded it may strike it.");
    const [result] = await tx.update(inclusions).set({ struckAt: now, struckBy: actorId, struckReason: reason }).where(and(mine, isNull(inclusions.struckAt)));
    if (result.affectedRows !== 1) throw new AppError("conflict", "This inclusion was struck already; the first reason stands.");
    await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
    await recordAudit(scope, { action: "inclusion.struck", subject: { kind: "stone", id: stone.id }, detail: { sequence }, reason });
  });
}
