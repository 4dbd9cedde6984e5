import { and, desc, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { conclusions, secondChecks, stones, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatInstant } from "#app/domain/calendar-date.ts";
import type { SecondCheckId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { hadAHand } from "./had-a-hand.server.ts";
import { selfCheckFrom } from "./self-check-from.ts";

/**
 * Begins the check of a concluded stone. From here on its readings, candidates and conclusion are kept from the checker
 * until they compare. It is somebody else's who had no hand in the examination; a sole practitioner's own, after a
 * delay, is kept as a self-check. The request's id becomes the check's.
 */
export async function startSecondCheck(ctx: LabContext, { stoneCode, requestId }: { stoneCode: string; requestId: SecondCheckId }): Promise<void> {
  requireRole(ctx, "secondChecks.do");
  const { laboratoryId, actorId, now, laboratory } = ctx;
  try {
    await inTransaction(ctx.db, async (tx) => {
      const scope = { ...ctx, db: tx };
      const [found] = await tx
        .select({ stoneId: stones.id, state: stones.examinationState, examinerId: stones.examinerId, conclusionId: conclusions.id, concludedAt: conclusions.concludedAt, concludedBy: conclusions.concludedBy })
        .from(stones)
        .leftJoin(conclusions, and(eq(conclusions.laboratoryId, stones.laboratoryId), eq(conclusions.stoneId, stones.id)))
        .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
        .orderBy(desc(conclusions.version))
        .limit(1)
        .for("update");
      if (!found) throw new AppError("not_found", "There is no such stone.");
      if (found.state !== "concluded" || !found.conclusionId || !found.concludedAt) throw new AppError("conflict", "This stone does not wait for a second check.");
      const isInvolved = found.examinerId === actorId || found.concludedBy === actorId || (await hadAHand(scope, found.stoneId));
      if (isInvolved) {
        if (!laboratory.isSolePractice) throw new AppError("forbidden", "You had a hand in this examination: the second check is somebody else's.");
        const from = selfCheckFrom({ concludedAt: found.concludedAt, delayHours: laboratory.selfCheckDelayHours });
        if (now < from) {
          throw new AppError("conflict", `A self-check begins at least ${laboratory.selfCheckDelayHours} hours after the conclusion: from ${formatInstant(from, laboratory.timeZone)}.`);
        }
      }
      const [existing] = await tx
        .select({ checkerId: secondChecks.checkerId, checker: users.name })
        .from(secondChecks)
        .innerJoin(users, eq(users.id, secondChecks.checkerId))
        .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.conclusionId, found.conclusionId)));
      if (existing?.checkerId === actorId) return;
      if (existing) throw new AppError("conflict", `${existing.checker} is checking this stone already.`);
      const kind = isInvolved ? "selfCheck" : "secondCheck";
      await tx.insert(secondChecks).values({ laboratoryId, id: requestId, stoneId: found.stoneId, conclusionId: found.conclusionId, kind, checkerId: actorId, startedAt: now });
      await recordAudit(scope, { action: "secondCheck.started", subject: { kind: "stone", id: found.stoneId }, detail: { kind } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    throw new AppError("conflict", "This stone is being checked already. Open it again to see by whom.", { cause: error });
  }
}
