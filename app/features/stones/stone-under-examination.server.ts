import { and, eq } from "drizzle-orm";
import { stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ItemId, StoneId, UserId } from "#app/domain/ids.ts";
import { examinationStateNames, type ExaminationState } from "#app/domain/stone-state.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { hasOwnOpenCheck } from "#app/features/second-checks/own-open-check.ts";

export type StoneUnderExamination = Readonly<{ id: StoneId; itemId: ItemId; description: string; examinerId: UserId | null; state: ExaminationState }>;

/**
 * The stone, locked where the context holds a transaction, when its examination still takes something up.
 * @throws AppError not_found or conflict
 */
export async function stoneUnderExamination(ctx: LabContext, stoneCode: string): Promise<StoneUnderExamination> {
  const [stone] = await ctx.db
    .select({ id: stones.id, itemId: stones.itemId, description: stones.description, examinerId: stones.examinerId, state: stones.examinationState, goodsState: stones.goodsState, isBlind: hasOwnOpenCheck(ctx.actorId) })
    .from(stones)
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode)))
    .for("update");
  if (!stone) throw new AppError("not_found", "There is no such stone.");
  if (Number(stone.isBlind)) throw new AppError("conflict", "You are checking this stone: what belongs to its examination is yours once you have compared.");
  if (stone.goodsState === "released") throw new AppError("conflict", "These goods have been released: nothing more can be recorded of them.");
  if (!["received", "examining", "returned"].includes(stone.state)) throw new AppError("conflict", `This stone stands at “${examinationStateNames[stone.state]}”: its examination takes nothing more up.`);
  return stone;
}
