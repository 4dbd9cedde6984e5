import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";

/** issued → examining, to amend: readings, conclusion and check run again, and the new report supersedes the issued one. */
export async function reopenStone(ctx: LabContext, { stoneCode, reason }: { stoneCode: string; reason: string }): Promise<void> {
  requireRole(ctx, "reports.withdraw");
  const [stone] = await ctx.db
    .select({ id: stones.id, state: stones.examinationState })
    .from(stones)
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode)));
  if (!stone) throw new AppError("not_found", "There is no such stone.");
  if (stone.state !== "issued") throw new AppError("conflict", "Only a stone whose report is issued can be opened again for an amendment.");
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    await moveExamination(scope, { stoneId: stone.id, from: "issued", to: "examining", why: reason });
    await recordAudit(scope, { action: "stone.reopened", subject: { kind: "stone", id: stone.id }, reason });
  });
}
