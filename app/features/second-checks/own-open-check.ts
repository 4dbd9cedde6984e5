import { sql, type SQL } from "drizzle-orm";
import { secondChecks, stones } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";

/** Whether the actor is making a check of the statement's stone and has not compared it: then nothing of the examination is theirs to see. */
export function hasOwnOpenCheck(actorId: UserId): SQL<number> {
  return sql<number>`exists (select 1 from second_checks own where own.laboratory_id = ${stones.laboratoryId} and own.stone_id = ${stones.id}
    and own.checker_id = ${sql.param(actorId, secondChecks.checkerId)} and own.compared_at is null)`;
}
