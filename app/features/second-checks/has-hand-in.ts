import { sql, type SQL } from "drizzle-orm";
import { observations, stones } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";

/** Whether somebody recorded anything of the examination of the statement's stone: a reading, an inclusion, a spectrum. */
export function hasHandIn(actorId: UserId): SQL<number> {
  const actor = sql.param(actorId, observations.observerId);
  const theirs = (table: "observations" | "inclusions" | "spectra", by: "observer_id" | "created_by") =>
    sql`exists (select 1 from ${sql.identifier(table)} hand where hand.laboratory_id = ${stones.laboratoryId} and hand.stone_id = ${stones.id} and hand.${sql.identifier(by)} = ${actor}${table === "observations" ? sql` and hand.second_check_id is null` : sql``})`;
  return sql<number>`(${theirs("observations", "observer_id")} or ${theirs("inclusions", "observer_id")} or ${theirs("spectra", "created_by")})`;
}
