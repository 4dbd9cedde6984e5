import { and, desc, eq } from "drizzle-orm";
import { instrumentChecks, instruments, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

const checksShown = 100;

/** An instrument with the latest of its checks. */
export async function getInstrument(ctx: LabContext, instrumentId: InstrumentId) {
  requireRole(ctx, "instruments.read");
  const [instrument] = await ctx.db
    .select()
    .from(instruments)
    .where(and(eq(instruments.laboratoryId, ctx.laboratoryId), eq(instruments.id, instrumentId)));
  if (!instrument) throw new AppError("not_found", "There is no such instrument.");
  const checks = await ctx.db
    .select({
      id: instrumentChecks.id,
      referenceMaterial: instrumentChecks.referenceMaterial,
      nominalValue: instrumentChecks.nominalValue,
      readingText: instrumentChecks.readingText,
      limitValue: instrumentChecks.limitValue,
      isPassed: instrumentChecks.isPassed,
      tempC: instrumentChecks.tempC,
      note: instrumentChecks.note,
      nextDueOn: instrumentChecks.nextDueOn,
      checkedAt: instrumentChecks.checkedAt,
      checkedBy: users.name,
    })
    .from(instrumentChecks)
    .innerJoin(users, eq(users.id, instrumentChecks.checkedBy))
    .where(and(eq(instrumentChecks.laboratoryId, ctx.laboratoryId), eq(instrumentChecks.instrumentId, instrumentId)))
    .orderBy(desc(instrumentChecks.checkedAt), desc(instrumentChecks.id))
    .limit(checksShown);
  const { laboratoryId: _, ...fields } = instrument;
  return { ...fields, ref: shortRef(instrument.id), checks };
}
