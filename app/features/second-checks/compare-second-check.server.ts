import { and, eq, isNull, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { observations, observationStrikes, secondChecks, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { Nature } from "#app/domain/conclusion.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { ownReadingsProblem } from "./own-readings-gate.ts";

export type CompareSecondCheck = { stoneCode: string; ownSpecies: string; ownNature: Nature };

/** The checker says what they found, for good; only then is the examination shown to them. */
export async function compareSecondCheck(ctx: LabContext, { stoneCode, ownSpecies, ownNature }: CompareSecondCheck): Promise<void> {
  requireRole(ctx, "secondChecks.do");
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const [check] = await tx
      .select({ id: secondChecks.id, stoneId: stones.id, state: stones.examinationState })
      .from(stones)
      .innerJoin(secondChecks, and(eq(secondChecks.laboratoryId, stones.laboratoryId), eq(secondChecks.stoneId, stones.id), eq(secondChecks.checkerId, actorId), isNull(secondChecks.comparedAt)))
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
      .for("update");
    if (!check) throw new AppError("not_found", "You have no open check of this stone.");
    if (check.state !== "concluded") throw new AppError("conflict", "The examination was taken up again meanwhile; this check has nothing to compare with.");
    const own = await tx
      .select({ kind: observations.kind, quality: observations.quality, strike: observationStrikes.observationId })
      .from(observations)
      .leftJoin(observationStrikes, and(eq(observationStrikes.laboratoryId, observations.laboratoryId), eq(observationStrikes.observationId, observations.id)))
      .where(and(eq(observations.laboratoryId, laboratoryId), eq(observations.stoneId, check.stoneId), eq(observations.secondCheckId, check.id)));
    const problem = ownReadingsProblem(own.map(({ kind, ...reading }) => ({ ...reading, detail: { kind } })));
    if (problem) throw new AppError("invalid_input", problem);
    const [compared] = await tx
      .update(secondChecks)
      .set({ comparedAt: now, ownSpecies, ownNature })
      .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.id, check.id), isNull(secondChecks.comparedAt)));
    if (compared.affectedRows !== 1) throw new AppError("conflict", "This check was compared already.");
    await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, check.stoneId)));
    await recordAudit({ ...ctx, db: tx }, { action: "secondCheck.compared", subject: { kind: "stone", id: check.stoneId } });
  });
}
