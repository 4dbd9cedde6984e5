import { isDeepStrictEqual } from "node:util";
import { and, eq, isNull, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instruments, itemConsents, items, observations, observationValues, secondChecks, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { decimalPlaces } from "#app/domain/decimal.ts";
import type { Id, InstrumentId, ObservationId, SecondCheckId } from "#app/domain/ids.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import { aboutTest, consentNeededFor, instrumentKindFor, observationKindNames, type ObservationKind, type ReadingDetail, type ReadingQuality } from "#app/domain/reading.ts";
import { examinationStateNames } from "#app/domain/stone-state.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import { outOfCheck } from "#app/features/instruments/check-standing.ts";
import { instrumentKindNames } from "#app/features/instruments/instrument-kinds.ts";
import { instrumentStanding } from "#app/features/instruments/instrument-standing.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";
import { composeAnyReading } from "./compose-any-reading.ts";
import type { ComposedReading } from "./compose-reading.ts";
import type { ReadingDraft } from "./reading-draft.ts";
import { observedAt } from "./observed-at.ts";
import { readingWarnings } from "./reading-warnings.ts";

export type RecordReading = Readonly<{
  requestId: Id<"observation">;
  stoneCode: string;
  instrumentId: InstrumentId | null;
  noResultReason: string;
  note: string;
  /** The observer had no candidates in view; in a second check they never have. */
  areCandidatesHidden: boolean;
  draft: ReadingDraft;
  /** When the reading was made by the clock of the device that kept it, where it waited for the line; null: now. */
  madeAt?: Date | null;
  /** The actor's own second check, begun and not compared yet, instead of the examination. */
  isForSecondCheck?: boolean;
}>;
export type RecordedReading = { sequence: number; warnings: string[] };

/**
 * Keeps one reading as it was made: the digits as typed, what follows from them, on which instrument and after which
 * check of it. The first one begins the examination and makes its observer the examiner. Sent twice, it is kept once.
 */
export async function recordReading(ctx: LabContext, input: RecordReading): Promise<RecordedReading> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  const { draft, requestId } = input;
  return inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const [stone] = await tx
      .select({ id: stones.id, itemId: stones.itemId, state: stones.examinationState, examinerId: stones.examinerId, goodsState: stones.goodsState, isMounted: stones.isMounted, weightText: stones.weightText })
      .from(stones)
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, input.stoneCode)))
      .for("update");
    if (!stone) throw new AppError("not_found", "There is no such stone.");

    const [repeat] = await tx
      .select({ id: observations.id, sequence: observations.sequence, stoneId: observations.stoneId, observerId: observations.observerId, detail: observations.detail, quality: observations.quality })
      .from(observations)
      .where(and(eq(observations.laboratoryId, laboratoryId), eq(observations.requestId, requestId)));
    if (repeat) {
      if (repeat.stoneId === stone.id && repeat.observerId === actorId && (await saysTheSame(scope, repeat, draft))) return { sequence: repeat.sequence, warnings: [] };
      throw new AppError("conflict", "This form was sent for another reading before. Open the page anew and send it again.");
    }

    const secondCheckId = await settleExamination(scope, { stone, isForSecondCheck: input.isForSecondCheck ?? false });
    if (stone.goodsState === "released") throw new AppError("conflict", "These goods have been released: nothing more can be read from them.");
    if (draft.quality !== "noResult") await requireConsent(scope, { kind: draft.kind, itemId: stone.itemId, isMounted: stone.isMounted });
    const madeAt = observedAt({ madeAt: input.madeAt ?? null, now });
    const { instrument, standing } = await findInstrument(scope, input, madeAt);
    const { reading, problems } = composeAnyReading(draft, instrument && { ...instrument, correction: standing?.correction });
    if (!reading) throw new AppError("invalid_input", Object.values(problems)[0]?.[0] ?? "This reading is not complete.", { fieldErrors: problems });

    const [counted] = await tx
      .update(stones)
      .set({ observationCount: sql`${stones.observationCount} + 1`, version: sql`${stones.version} + 1`, ...weightOf(reading, { isMounted: stone.isMounted, isFirst: secondCheckId === null }) })
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
    if (counted.affectedRows !== 1) throw new Error("the locked stone vanished");
    const [{ sequence } = { sequence: 0 }] = await tx.select({ sequence: stones.observationCount }).from(stones).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));

    await tx.insert(observations).values({
      laboratoryId,
      id: requestId as ObservationId,
      stoneId: stone.id,
      sequence,
      kind: reading.detail.kind,
      secondCheckId,
      instrumentId: instrument?.id ?? null,
      instrumentCheckId: standing?.passed?.id ?? null,
      instrumentCorrectionId: isCorrected(reading) ? (standing?.correction?.id ?? null) : null,
      observerId: actorId,
      observedAt: madeAt,
      recordedAt: now,
      detail: reading.detail,
      quality: reading.quality,
      noResultReason: input.noResultReason,
      note: input.note,
      isBlind: secondCheckId !== null || input.areCandidatesHidden,
      requestId,
    });
    if (reading.values.length > 0) await tx.insert(observationValues).values(reading.values.map((value) => ({ laboratoryId, observationId: requestId as ObservationId, ...value })));
    await recordAudit(scope, { action: "reading.recorded", subject: { kind: "stone", id: stone.id }, detail: { sequence, kind: reading.detail.kind } });
    return { sequence, warnings: readingWarnings({ reading, instrument, outOfCheck: instrument && standing ? outOfCheckOf(ctx, instrument, standing) : null, earlierWeightText: secondCheckId === null ? stone.weightText : "" }) };
  });
}

/** The same form once more, not another reading under its id: by what was seen and the digits as typed. */
async function saysTheSame({ db, laboratoryId }: LabContext, kept: { id: ObservationId; detail: ReadingDetail; quality: ReadingQuality }, draft: ReadingDraft): Promise<boolean> {
  const { reading } = composeAnyReading(draft, null);
  if (!reading || reading.quality !== kept.quality || !isDeepStrictEqual(seenIn(reading.detail), seenIn(kept.detail))) return false;
  const digits = await db
    .select({ typedText: observationValues.typedText })
    .from(observationValues)
    .where(and(eq(observationValues.laboratoryId, laboratoryId), eq(observationValues.observationId, kept.id), isNull(observationValues.formula)));
  const typed = reading.values.filter(({ formula }) => formula === null).map(({ typedText }) => typedText);
  return isDeepStrictEqual(digits.map(({ typedText }) => typedText).sort(), typed.sort());
}

/** A run's crystals follow from its lines and its instrument. */
function seenIn(detail: ReadingDetail): object {
  return detail.kind === "rotation" ? { kind: detail.kind, light: detail.light, rows: detail.rows } : detail;
}

/** A correction went into its figures, or into the edges that its fit was made from. */
function isCorrected({ values }: ComposedReading): boolean {
  return values.some(({ rawValue, formula }) => typeof rawValue === "number" || formula?.endsWith(", corrected"));
}

type LockedStone = { id: Id<"stone">; state: keyof typeof examinationStateNames; examinerId: Id<"user"> | null };

/** @returns the second check that the reading belongs to; null for the examination, which is begun where it was not */
async function settleExamination(ctx: LabContext, { stone, isForSecondCheck }: { stone: LockedStone; isForSecondCheck: boolean }): Promise<SecondCheckId | null> {
  const { db, laboratoryId, actorId } = ctx;
  if (isForSecondCheck) {
    const [check] = await db
      .select({ id: secondChecks.id })
      .from(secondChecks)
      .where(and(eq(secondChecks.laboratoryId, laboratoryId), eq(secondChecks.stoneId, stone.id), eq(secondChecks.checkerId, actorId), isNull(secondChecks.comparedAt)));
    if (!check || stone.state !== "concluded") throw new AppError("conflict", "Your check of this stone is not open: it was not begun, or it was compared already.");
    return check.id;
  }
  if (stone.state === "received" || stone.state === "returned") {
    const why = stone.state === "received" ? "First reading" : "Examination taken up again after the check returned it";
    await moveExamination(ctx, { stoneId: stone.id, from: stone.state, to: "examining", why });
  } else if (stone.state !== "examining") {
    throw new AppError("conflict", `This stone stands at “${examinationStateNames[stone.state]}”: its examination takes no readings now.`);
  }
  if (stone.examinerId === null) {
    await db.update(stones).set({ examinerId: actorId }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id), isNull(stones.examinerId)));
  }
  return null;
}

async function requireConsent(ctx: LabContext, { kind, itemId, isMounted }: { kind: ObservationKind; itemId: Id<"item">; isMounted: boolean }): Promise<void> {
  const code = consentNeededFor[kind];
  if (!code && kind !== "weight") return;
  const [item] = await ctx.db
    .select({ mount: items.mount, isGiven: itemConsents.isGiven })
    .from(items)
    .leftJoin(itemConsents, and(eq(itemConsents.laboratoryId, items.laboratoryId), eq(itemConsents.itemId, items.id), eq(itemConsents.code, code ?? "hydrostatic")))
    .where(and(eq(items.laboratoryId, ctx.laboratoryId), eq(items.id, itemId)));
  const isStrung = item?.mount === "strung";
  if (kind === "density" && (isMounted || isStrung)) throw refusal(`A ${isStrung ? "strung" : "mounted"} stone is not weighed in water: the weight would be that of everything together. Record “No reading”, because the mount blocks it.`);
  if (kind === "weight" && (isMounted || isStrung)) throw refusal(`A ${isStrung ? "strung" : "mounted"} stone cannot be weighed by itself. Record “No reading”, because the mount blocks it.`);
  if (code && !item?.isGiven) {
    throw refusal(`The client has not agreed to ${consentWords[code] ?? "this test"}. Record “No reading”, consent refused, or ask the client first.`);
  }
}

const consentWords: Partial<Record<ConsentCode, string>> = {
  contactLiquid: "contact liquid on a facet",
  hydrostatic: "weighing in water",
  ultraviolet: "ultraviolet light",
  immersionLiquid: "immersion in a liquid",
  heavyLiquid: "heavy liquids",
  thermalProbe: "the thermal probe",
};

function refusal(message: string): AppError {
  return new AppError("invalid_input", message, { fieldErrors: { quality: [message] } });
}

async function findInstrument(ctx: LabContext, { instrumentId, draft }: RecordReading, madeAt: Date) {
  const kind = instrumentKindFor[draft.kind];
  const wrong = (message: string) => new AppError("invalid_input", message, { fieldErrors: { instrument: [message] } });
  if (instrumentId === null) {
    if (!aboutTest(draft.kind).needsInstrument || draft.quality === "noResult") return { instrument: null, standing: null };
    throw wrong("Choose the instrument that showed it.");
  }
  const { db, laboratoryId } = ctx;
  const [instrument] = await db.select().from(instruments).where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.id, instrumentId)));
  if (!instrument) throw wrong("Choose an instrument of this laboratory.");
  if (kind !== null && instrument.kind !== kind) throw wrong(`${observationKindNames[draft.kind]} is read on another kind of instrument: ${instrument.name} is a ${instrumentKindNames[instrument.kind].toLowerCase()}.`);
  if (instrument.status === "outOfService" && draft.quality !== "noResult") {
    throw wrong(`${instrument.name} is out of service${instrument.statusReason ? `: ${instrument.statusReason}` : ""}. Choose another.`);
  }
  return { instrument, standing: await instrumentStanding(ctx, instrument, madeAt) };
}

type Found = Awaited<ReturnType<typeof findInstrument>>;

function outOfCheckOf({ now, laboratory }: LabContext, { name, kind }: NonNullable<Found["instrument"]>, { passed, failing }: NonNullable<Found["standing"]>): string | null {
  return outOfCheck({ name, kind, nextDueOn: passed?.nextDueOn ?? null, failing, hasChecks: passed !== null || failing.length > 0 }, calendarDateIn(now, laboratory.timeZone));
}

/** A good weighing of a loose stone becomes the weight that the logbook shows. */
function weightOf({ detail, quality, values }: ComposedReading, { isMounted, isFirst }: { isMounted: boolean; isFirst: boolean }) {
  const weight = values.find(({ name }) => name === "weightCt");
  if (detail.kind !== "weight" || quality !== "good" || isMounted || !isFirst || !weight) return {};
  return { weightCt: weight.value, weightText: weight.value.toFixed(decimalPlaces(weight.typedText)) };
}
