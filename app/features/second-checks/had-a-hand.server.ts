import { and, eq, isNull } from "drizzle-orm";
import { observations } from "#app/db/schema/index.ts";
import type { StoneId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";

/** Whether the actor made any reading of the examination: then their check of it would not be a second pair of eyes. */
export async function hadAHand({ db, laboratoryId, actorId }: Pick<LabContext, "db" | "laboratoryId" | "actorId">, stoneId: StoneId): Promise<boolean> {
  const [one] = await db
    .select({ id: observations.id })
    .from(observations)
    .where(and(eq(observations.laboratoryId, laboratoryId), eq(observations.stoneId, stoneId), eq(observations.observerId, actorId), isNull(observations.secondCheckId)))
    .limit(1);
  return one !== undefined;
}
