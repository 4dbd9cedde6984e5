import { and, desc, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { stones, valuationComparables, valuations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { certificationPoints } from "#app/domain/valuation.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** draft → signed: complete, every point certified, and as it was read (`rowVersion`). Only then are declared value and fee shown. */
export async function signValuation(ctx: LabContext, { stoneCode, rowVersion }: { stoneCode: string; rowVersion: number }): Promise<void> {
  requireRole(ctx, "valuations.write");
  const { laboratoryId } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const [found] = await tx
      .select({ valuation: valuations, stoneState: stones.examinationState })
      .from(stones)
      .innerJoin(valuations, and(eq(valuations.laboratoryId, stones.laboratoryId), eq(valuations.stoneId, stones.id)))
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
      .orderBy(desc(valuations.version))
      .limit(1);
    if (!found) throw new AppError("not_found", "There is no draft of a valuation for this stone.");
    const { valuation } = found;
    if (valuation.state === "signed") throw new AppError("conflict", "This valuation is already signed.");
    if (found.stoneState !== "checked") throw new AppError("conflict", "The identity of this stone is no longer in the state that was valued.");
    if (valuation.amountMinor === null) throw refused("amount", "Enter the value and save the draft before signing.");
    const comparables = await tx
      .select({ position: valuationComparables.position })
      .from(valuationComparables)
      .where(and(eq(valuationComparables.laboratoryId, laboratoryId), eq(valuationComparables.valuationId, valuation.id)));
    if (comparables.length === 0) throw refused("comparables", "The comparison approach needs at least one comparable. Add one and save the draft.");
    if (valuation.approachReasoning.trim() === "") throw refused("approachReasoning", "Say how the comparables lead to the value.");
    if (valuation.limitingConditions.length === 0) throw refused("limitingConditions", "State at least one limiting condition.");
    const missing = certificationPoints.filter((point) => !valuation.certification.includes(point));
    if (missing.length > 0) throw refused("certification", "Every point of the certification must be true and ticked before you sign.");

    const [result] = await tx
      .update(valuations)
      .set({ state: "signed", signedBy: ctx.actorId, signedAt: ctx.now, rowVersion: rowVersion + 1 })
      .where(and(eq(valuations.laboratoryId, laboratoryId), eq(valuations.id, valuation.id), eq(valuations.state, "draft"), eq(valuations.rowVersion, rowVersion)));
    if (result.affectedRows !== 1) throw new AppError("conflict", "The draft was changed after you opened it. Read it again before you sign.");
    await recordAudit({ ...ctx, db: tx }, { action: "valuation.signed", subject: { kind: "valuation", id: valuation.id } });
  });
}

function refused(field: string, message: string): AppError {
  return new AppError("invalid_input", message, { fieldErrors: { [field]: [message] } });
}
