import { sql } from "drizzle-orm";
import { observations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { StoneId } from "#app/domain/ids.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { callsBack, isOpen } from "./called-back.server.ts";

/** @throws AppError conflict while a reading of the stone that stands is called back and nobody has answered for it: work that may be wrong goes no further (workflow 1.15) */
export async function requireNoRecall({ db, laboratoryId }: LabScope, { stoneId }: { stoneId: StoneId }): Promise<void> {
  const [rows] = (await db.execute(sql`
    select o.sequence, i.name, k.reference_material failedOn from observations o join instrument_checks k on ${callsBack} join instruments i on i.laboratory_id = k.laboratory_id and i.id = k.instrument_id
    where o.laboratory_id = ${sql.param(laboratoryId, observations.laboratoryId)} and o.stone_id = ${sql.param(stoneId, observations.stoneId)} and ${isOpen}
      and not exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id)
    order by o.sequence limit 1`)) as unknown as [Array<{ sequence: number; name: string; failedOn: string }>];
  const [first] = rows;
  if (first) throw new AppError("conflict", `${first.name} failed its check with ${first.failedOn} after reading ${first.sequence}, which this report would rely on. Answer for it on the recall list under Instruments first.`);
}
