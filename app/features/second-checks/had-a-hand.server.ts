import { and, eq } from "drizzle-orm";
import { stones } from "#app/db/schema/index.ts";
import type { StoneId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { hasHandIn } from "./has-hand-in.ts";

/** Whether the actor recorded anything of the examination: then their check of it would not be a second pair of eyes. */
export async function hadAHand({ db, laboratoryId, actorId }: Pick<LabContext, "db" | "laboratoryId" | "actorId">, stoneId: StoneId): Promise<boolean> {
  const [row] = await db
    .select({ hasHand: hasHandIn(actorId) })
    .from(stones)
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stoneId)));
  return Boolean(Number(row?.hasHand ?? 0));
}
