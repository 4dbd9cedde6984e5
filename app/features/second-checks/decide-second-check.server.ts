import { and, eq, isNotNull, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { secondChecks, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";

export type DecideSecondCheck = { stoneCode: string; outcome: "agreed" | "returned"; reason: string };

/** After the comparison: agreed → checked, or returned with a reason, so that the examination is taken up again. Once. */
export async function decideSecondCheck(ctx: LabContext, { stoneCode, outcome, reason }: DecideSecondCheck): Promise<void> {
  requireRole(ctx, "secondChecks.do");
  if (outcome === "returned" && reason.trim() === "") {
    const message = "Say why the stone goes back: the examiner reads it.";
    throw new AppError("invalid_input", message, { fieldErrors: { reason: [message] } });
  }
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const [check] = await tx
      .select({ id: secondChecks.id, kind: secondChecks.kind, stoneId: stones.id })
      .from(stones)
      .leftJoin(secondChecks, and(eq(secondChecks.laboratoryId, stones.laboratoryId), eq(secondChecks.stoneId, stones.id), eq(secondChecks.checkerId, actorId), isNotNull(secondChecks.comparedAt), isNull(secondChecks.decidedAt)))
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
      .for("update");
    if (!check) throw new AppError("not_found", "There is no stone of this number.");
    const { id: checkId } = check;
    if (!checkId) throw new AppError("conflict", "There is no compared check of yours to decide: it was decided already, or not compared yet.");
    const [decided] = await tx
      .update(secondChecks)
      .set({ outcome, reason, decidedAt: now })
      .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.id, checkId), isNull(secondChecks.decidedAt)));
    if (decided.affectedRows !== 1) throw new AppError("conflict", "This check was decided already.");
    const name = check.kind === "selfCheck" ? "Self-check" : "Second check";
    await moveExamination(scope, outcome === "agreed" ? { stoneId: check.stoneId, from: "concluded", to: "checked", why: `${name} agrees` } : { stoneId: check.stoneId, from: "concluded", to: "returned", why: reason.slice(0, 500) });
    await recordAudit(scope, { action: "secondCheck.decided", subject: { kind: "stone", id: check.stoneId }, detail: { outcome }, reason });
  });
}
