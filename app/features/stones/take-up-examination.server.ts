import { and, eq, isNull } from "drizzle-orm";
import { stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { StoneId, UserId } from "#app/domain/ids.ts";
import { examinationStateNames, type ExaminationState } from "#app/domain/stone-state.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { moveExamination } from "./move-examination.server.ts";

/**
 * What is recorded of a stone begins its examination, or takes it up again after a check returned it; whoever records
 * first is its examiner. To be run in the transaction that records, with the stone locked.
 * @param what of the first that was recorded, as a sentence's beginning: "First reading"
 */
export async function takeUpExamination(ctx: LabContext, { stone, what }: { stone: { id: StoneId; state: ExaminationState; examinerId: UserId | null }; what: string }): Promise<void> {
  const { db, laboratoryId, actorId } = ctx;
  if (stone.state === "received" || stone.state === "returned") {
    const why = stone.state === "received" ? what : "Examination taken up again after the check returned it";
    await moveExamination(ctx, { stoneId: stone.id, from: stone.state, to: "examining", why });
  } else if (stone.state !== "examining") {
    throw new AppError("conflict", `This stone stands at “${examinationStateNames[stone.state]}”: its examination takes nothing more up.`);
  }
  if (stone.examinerId === null) {
    await db.update(stones).set({ examinerId: actorId }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id), isNull(stones.examinerId)));
  }
}
