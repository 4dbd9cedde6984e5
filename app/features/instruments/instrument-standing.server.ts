import { and, desc, eq, isNull, sql } from "drizzle-orm";
import { instrumentChecks, instrumentCorrections, type instruments } from "#app/db/schema/index.ts";
import { scaleUnitsOf } from "#app/domain/instrument-scale.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import type { AppliedCorrection } from "./apply-correction.ts";

type Instrument = Pick<typeof instruments.$inferSelect, "id" | "kind" | "scaleUnit">;
type Scope = Pick<LabScope, "db" | "laboratoryId">;

/** A reference whose latest check failed: nothing but another check with the same one says that it is mended. */
export const latestFailure = sql`not k.is_passed and not exists (select 1 from instrument_checks later where later.laboratory_id = k.laboratory_id and later.instrument_id = k.instrument_id
  and later.checked_at > k.checked_at and later.is_passed and (later.reference_material_id = k.reference_material_id or (later.reference_material_id is null and k.reference_material_id is null and later.reference_material = k.reference_material)))`;

/** How an instrument stands: its last passed check, the references that it fails now, the correction in force. */
export async function instrumentStanding(scope: Scope, instrument: Instrument) {
  const { db, laboratoryId } = scope;
  const [passed] = await db
    .select({ id: instrumentChecks.id, nextDueOn: instrumentChecks.nextDueOn })
    .from(instrumentChecks)
    .where(and(eq(instrumentChecks.laboratoryId, laboratoryId), eq(instrumentChecks.instrumentId, instrument.id), eq(instrumentChecks.isPassed, true)))
    .orderBy(desc(instrumentChecks.checkedAt))
    .limit(1);
  return { passed: passed ?? null, failing: await failingReferences(scope, instrument.id), correction: await correctionInForce(scope, instrument) };
}

/** The names of the references that an instrument's latest check with them failed on. */
export async function failingReferences({ db, laboratoryId }: Scope, instrumentId: Instrument["id"]): Promise<string[]> {
  const k = sql`${instrumentChecks} k`;
  const rows = await db
    .select({ referenceMaterial: sql<string>`k.reference_material` })
    .from(k)
    .where(sql`k.laboratory_id = ${sql.param(laboratoryId, instrumentChecks.laboratoryId)} and k.instrument_id = ${sql.param(instrumentId, instrumentChecks.instrumentId)} and ${latestFailure}`)
    .orderBy(sql`k.checked_at`);
  return [...new Set(rows.map(({ referenceMaterial }) => referenceMaterial))];
}

/** The correction that readings of now are made with; null where none is in force. */
export async function correctionInForce({ db, laboratoryId }: Scope, { id, kind, scaleUnit }: Instrument): Promise<(AppliedCorrection & { id: typeof instrumentCorrections.$inferSelect.id }) | null> {
  const [row] = await db
    .select({ id: instrumentCorrections.id, correction: instrumentCorrections.correction })
    .from(instrumentCorrections)
    .where(and(eq(instrumentCorrections.laboratoryId, laboratoryId), eq(instrumentCorrections.instrumentId, id), isNull(instrumentCorrections.endedAt)))
    .orderBy(desc(instrumentCorrections.fromAt), desc(instrumentCorrections.id))
    .limit(1);
  const unit = scaleUnit ?? scaleUnitsOf[kind][0];
  return row && unit ? { id: row.id, correction: row.correction, unit } : null;
}
