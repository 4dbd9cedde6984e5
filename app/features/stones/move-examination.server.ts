import { and, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { stoneEvents, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { StoneId } from "#app/domain/ids.ts";
import { canMoveExamination, examinationStateNames, type ExaminationState } from "#app/domain/stone-state.ts";
import type { LabScope } from "#app/features/lab-context.ts";

/**
 * Moves a stone's examination from one state to another, exactly once: the WHERE is the lock, the row count the verdict.
 * The event that says who, when and why is written with it, so this runs inside a transaction.
 * @throws AppError conflict when the stone is not, or no longer, in `from`
 */
export async function moveExamination(
  scope: LabScope,
  { stoneId, from, to, why }: { stoneId: StoneId; from: ExaminationState; to: ExaminationState; why: string },
): Promise<void> {
  if (!canMoveExamination(from, to)) throw new Error(`no move from ${from} to ${to}`);
  const [result] = await scope.db
    .update(stones)
    .set({ examinationState: to, examinationStateAt: scope.now })
    .where(and(eq(stones.laboratoryId, scope.laboratoryId), eq(stones.id, stoneId), eq(stones.examinationState, from)));
  if (result.affectedRows !== 1) {
    throw new AppError("conflict", `This stone is not in the state “${examinationStateNames[from]}” any more. Open it again to see how it stands.`);
  }
  await scope.db.insert(stoneEvents).values({
    laboratoryId: scope.laboratoryId,
    id: newId<"stoneEvent">(),
    stoneId,
    machine: "examination",
    fromState: from,
    toState: to,
    why,
    at: scope.now,
    by: scope.actorId,
  });
}
