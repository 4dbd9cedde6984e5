import { and, eq, isNull, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { observations, observationStrikes, secondChecks, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { Id } from "#app/domain/ids.ts";
import { examinationStateNames } from "#app/domain/stone-state.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** A reading is named by its number, or, by a device that has not heard of its number yet, by the form that made it. */
export type StrikeReading = { stoneCode: string; reason: string } & ({ sequence: number } | { requestId: Id<"observation"> });

/**
 * Strikes a reading through: it stays legible, with who, when and why, and is left out of the ranking. Once. The
 * examiner and whoever made it may, while the examination is theirs to change; a check's own while it is not compared.
 */
export async function strikeReading(ctx: LabContext, { stoneCode, reason, ...named }: StrikeReading): Promise<void> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  try {
    await inTransaction(ctx.db, async (tx) => {
      const [found] = await tx
        .select({
          observationId: observations.id,
          sequence: observations.sequence,
          observerId: observations.observerId,
          stoneId: stones.id,
          state: stones.examinationState,
          examinerId: stones.examinerId,
          secondCheckId: observations.secondCheckId,
          comparedAt: secondChecks.comparedAt,
        })
        .from(stones)
        .innerJoin(observations, and(eq(observations.laboratoryId, stones.laboratoryId), eq(observations.stoneId, stones.id), "sequence" in named ? eq(observations.sequence, named.sequence) : eq(observations.requestId, named.requestId)))
        .leftJoin(secondChecks, and(eq(secondChecks.laboratoryId, observations.laboratoryId), eq(secondChecks.id, observations.secondCheckId)))
        .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
        .for("update");
      if (!found || (await isHiddenFrom({ ...ctx, db: tx }, found))) throw new AppError("not_found", "There is no such reading.");
      const { state } = found;
      if (found.secondCheckId !== null) {
        if (found.observerId !== actorId) throw new AppError("forbidden", "Only the checker strikes the readings of a check.");
        if (state !== "concluded" || found.comparedAt !== null) throw new AppError("conflict", "This check was compared already: its readings stay as they are.");
      } else {
        if (found.observerId !== actorId && found.examinerId !== actorId) throw new AppError("forbidden", "Only the examiner of this stone or whoever made the reading may strike it.");
        if (state !== "examining" && state !== "returned") throw new AppError("conflict", `This stone stands at “${examinationStateNames[state]}”: its readings stay as they are.`);
      }
      const [earlier] = await tx
        .select({ reason: observationStrikes.reason, struckBy: observationStrikes.struckBy })
        .from(observationStrikes)
        .where(and(eq(observationStrikes.laboratoryId, laboratoryId), eq(observationStrikes.observationId, found.observationId)));
      // The same words once more, from a device that did not hear the answer.
      if (earlier && earlier.struckBy === actorId && earlier.reason === reason) return;
      await tx.insert(observationStrikes).values({ laboratoryId, observationId: found.observationId, reason, struckAt: now, struckBy: actorId });
      await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, found.stoneId)));
      await recordAudit({ ...ctx, db: tx }, { action: "reading.struck", subject: { kind: "stone", id: found.stoneId }, detail: { sequence: found.sequence }, reason });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    throw new AppError("conflict", "This reading was struck already; the first reason stands.", { cause: error });
  }
}

/** Readings that a checker may not see yet are not there for them, not even to be refused. */
async function isHiddenFrom({ db, laboratoryId, actorId }: LabContext, { stoneId, secondCheckId, observerId, comparedAt }: { stoneId: typeof stones.$inferSelect.id; secondCheckId: string | null; observerId: string; comparedAt: Date | null }): Promise<boolean> {
  if (secondCheckId !== null) return observerId !== actorId && comparedAt === null;
  const [open] = await db
    .select({ id: secondChecks.id })
    .from(secondChecks)
    .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.stoneId, stoneId), eq(secondChecks.checkerId, actorId), isNull(secondChecks.comparedAt)));
  return open !== undefined;
}
