import { inTransaction } from "#app/db/in-transaction.server.ts";
import { stonePlots } from "#app/db/schema/index.ts";
import type { CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";

/** Chooses the drawing that a stone's inclusions are plotted on. What was placed keeps its share of width and height. */
export async function setStoneOutline(ctx: LabContext, { stoneCode, outline }: { stoneCode: string; outline: CutOutlineCode }): Promise<void> {
  requireRole(ctx, "readings.record");
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const stone = await stoneUnderExamination(scope, stoneCode);
    const change = { outline, changedAt: ctx.now, changedBy: ctx.actorId };
    await tx
      .insert(stonePlots)
      .values({ laboratoryId: ctx.laboratoryId, stoneId: stone.id, ...change })
      .onDuplicateKeyUpdate({ set: change });
    await recordAudit(scope, { action: "inclusion.outlineChosen", subject: { kind: "stone", id: stone.id }, detail: { outline } });
  });
}
