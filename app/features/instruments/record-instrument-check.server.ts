import { and, desc, eq, lt, or, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instrumentChecks, instruments, referenceMaterials } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { Id, InstrumentId, ReferenceMaterialId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { applyCorrection } from "./apply-correction.ts";
import { correctionInForce } from "./instrument-standing.server.ts";
import { isWithinLimit } from "./is-within-limit.ts";
import { scaleUnitOf } from "./scale-uncertainty.ts";

type Typed = Readonly<{ value: number; text: string }>;
export type InstrumentCheckInput = Readonly<{
  requestId: Id<"instrumentCheck">;
  /** From the laboratory's list: its name, value and limit then stand in place of what is written here. */
  referenceId?: ReferenceMaterialId | null;
  referenceMaterial: string;
  nominal: Typed | null;
  nominalUncertainty?: number | null;
  reading: Typed | null;
  limit: Typed | null;
  /** What was seen, of an instrument without a scale. */
  seen?: Readonly<{ text: string; isAsExpected: boolean }> | null;
  tempC: number | null;
  /** Calendar date in the laboratory's zone. */
  nextDueOn: string;
  note: string;
}>;

/**
 * A reading of a reference, judged by its limit: corrected first where a correction is in force, as readings of stones
 * are. A check that fails takes the instrument out of service at once and calls back what was read on it since the last
 * good check; putting it back is a person's decision, with another check before it.
 *
 * @returns whether it passed
 */
export async function recordInstrumentCheck(ctx: LabContext, instrumentId: InstrumentId, input: InstrumentCheckInput): Promise<{ isPassed: boolean }> {
  requireRole(ctx, "instruments.manage");
  const { requestId, tempC, nextDueOn, note } = input;
  if (nextDueOn <= calendarDateIn(ctx.now, ctx.laboratory.timeZone)) throw wrong("nextDueOn", "The next check is after today.");
  try {
    return await inTransaction(ctx.db, async (tx) => {
      const scope = { ...ctx, db: tx };
      const mine = and(eq(instruments.laboratoryId, ctx.laboratoryId), eq(instruments.id, instrumentId));
      const [instrument] = await tx.select().from(instruments).where(mine).for("update");
      if (!instrument) throw new AppError("not_found", "There is no such instrument.");
      const reference = await findReference(scope, instrument, input);
      const judged = await judge(scope, instrument, { ...input, ...reference });
      const { isPassed } = judged;
      await tx.insert(instrumentChecks).values({
        laboratoryId: ctx.laboratoryId,
        id: requestId,
        instrumentId,
        referenceMaterial: reference.referenceMaterial,
        referenceMaterialId: reference.referenceId,
        nominalUncertainty: reference.nominalUncertainty,
        ...judged,
        recallSince: isPassed ? null : await recallSince(scope, instrumentId, reference),
        tempC,
        note,
        nextDueOn,
        checkedAt: ctx.now,
        checkedBy: ctx.actorId,
      });
      if (!isPassed && instrument.status !== "outOfService") {
        await tx
          .update(instruments)
          .set({ status: "outOfService", statusReason: `Failed its check with ${reference.referenceMaterial}`.slice(0, 300), version: sql`${instruments.version} + 1` })
          .where(mine);
      }
      await recordAudit(scope, { action: "instrument.checked", subject: { kind: "instrument", id: instrumentId }, detail: { isPassed } });
      return { isPassed };
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db
      .select({ isPassed: instrumentChecks.isPassed })
      .from(instrumentChecks)
      .where(and(eq(instrumentChecks.laboratoryId, ctx.laboratoryId), eq(instrumentChecks.id, requestId)));
    if (!made) throw error;
    return made;
  }
}

type Instrument = typeof instruments.$inferSelect;
type Reference = { referenceId: ReferenceMaterialId | null; referenceMaterial: string; nominal: Typed | null; nominalUncertainty: number | null; limit: Typed | null };

async function findReference({ db, laboratoryId }: LabContext, instrument: Instrument, input: InstrumentCheckInput): Promise<Reference> {
  const { referenceMaterial, nominal, limit } = input;
  if (!input.referenceId) return { referenceId: null, referenceMaterial, nominal, nominalUncertainty: input.nominalUncertainty ?? null, limit };
  const [found] = await db
    .select()
    .from(referenceMaterials)
    .where(and(eq(referenceMaterials.laboratoryId, laboratoryId), eq(referenceMaterials.id, input.referenceId)));
  if (!found) throw wrong("reference", "Choose a reference of this laboratory.");
  if (found.isRetired) throw wrong("reference", `${found.name} is retired. Choose another.`);
  if (found.forKind !== instrument.kind || (found.nominalValue !== null && found.unit !== scaleUnitOf(instrument))) throw wrong("reference", `${found.name} is a reference for another kind of instrument or scale.`);
  const typed = (value: number | null) => (value === null ? null : { value, text: String(value) });
  return { referenceId: found.id, referenceMaterial: found.name, nominal: typed(found.nominalValue), nominalUncertainty: found.standardUncertainty, limit: limit ?? typed(found.limitValue) };
}

/** What is kept of the reading, and whether it is good enough. */
async function judge(ctx: LabContext, instrument: Instrument, { nominal, reading, limit, seen }: InstrumentCheckInput) {
  if (scaleUnitOf(instrument) === null && seen) return { readingText: seen.text, isPassed: seen.isAsExpected };
  if (!nominal) throw wrong("nominal", "Write the reference's own value.");
  if (!reading) throw wrong("reading", "Write what the instrument showed.");
  if (!limit) throw wrong("limit", "Write how far it may be off.");
  const correction = await correctionInForce(ctx, instrument);
  const corrected = correction && applyCorrection(correction, { value: reading.value, unit: correction.unit });
  return {
    nominalValue: nominal.value,
    readingValue: reading.value,
    readingText: reading.text,
    limitValue: limit.value,
    correctionId: corrected ? correction.id : null,
    correctedValue: corrected ? Number(corrected.value.toFixed(6)) : null,
    isPassed: isWithinLimit({ nominal: nominal.value, reading: corrected ? corrected.value : reading.value, limit: limit.value }),
  };
}

/**
 * Since when readings are in doubt: the check before this one with the same reference (a failed one called back what was
 * before it). Was there none, the last good check with any other on an earlier day, since those of one round are made
 * minutes apart and say the same of the time before; was there none either, all of them (null).
 */
async function recallSince({ db, laboratoryId, now, laboratory }: LabContext, instrumentId: InstrumentId, { referenceId, referenceMaterial }: Reference): Promise<Date | null> {
  const same = referenceId ? eq(instrumentChecks.referenceMaterialId, referenceId) : and(sql`${instrumentChecks.referenceMaterialId} is null`, eq(instrumentChecks.referenceMaterial, referenceMaterial));
  const earlier = await db
    .select({ checkedAt: instrumentChecks.checkedAt, isSame: sql<number>`${same}` })
    .from(instrumentChecks)
    .where(and(eq(instrumentChecks.laboratoryId, laboratoryId), eq(instrumentChecks.instrumentId, instrumentId), lt(instrumentChecks.checkedAt, now), or(same, eq(instrumentChecks.isPassed, true))))
    .orderBy(desc(instrumentChecks.checkedAt));
  const today = calendarDateIn(now, laboratory.timeZone);
  const isSame = earlier.find((check) => Boolean(Number(check.isSame)));
  return (isSame ?? earlier.find(({ checkedAt }) => calendarDateIn(checkedAt, laboratory.timeZone) < today))?.checkedAt ?? null;
}

function wrong(field: string, message: string): AppError {
  return new AppError("invalid_input", message, { fieldErrors: { [field]: [message] } });
}
