import { and, asc, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { items, parcelRows, parcels, stoneEvents, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentId, ItemId, StoneId } from "#app/domain/ids.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import { instrumentKindFor, observationKindNames, type ObservationKind } from "#app/domain/reading.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { indexStoneSearch } from "#app/features/stones/index-stone-search.server.ts";
import { rowReadings, type HowRead } from "./row-readings.ts";

export type OpenParcelStone = HowRead & Readonly<{ position: number; refractometerId: InstrumentId | null; balanceId: InstrumentId | null; polariscopeId: InstrumentId | null }>;
/** The stone that a row became, and whether the item had none left for it. */
export type OpenedStone = { stoneCode: string; isAdded: boolean };

/**
 * Makes a stone of its own of a parcel's row, its figures carried over as readings that name the parcel and the row: all
 * of them, or nothing. It takes the item's stone whose number is the row's mark, else the first without readings; where
 * all have some, a further one is opened in the same item.
 */
export async function openParcelStone(ctx: LabContext, parcelId: ParcelId, input: OpenParcelStone): Promise<OpenedStone> {
  requireRole(ctx, "readings.record");
  const { laboratoryId } = ctx;
  return inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const [row] = await tx
      .select({ parcel: parcels, cells: parcelRows.cells, stoneCode: stones.code })
      .from(parcels)
      .innerJoin(parcelRows, and(eq(parcelRows.laboratoryId, parcels.laboratoryId), eq(parcelRows.parcelId, parcels.id), eq(parcelRows.position, input.position)))
      .leftJoin(stones, and(eq(stones.laboratoryId, parcelRows.laboratoryId), eq(stones.id, parcelRows.stoneId)))
      .where(and(eq(parcels.laboratoryId, laboratoryId), eq(parcels.id, parcelId)))
      .for("update");
    if (!row) throw new AppError("not_found", "There is no such row.");
    const { parcel, cells } = row;
    if (row.stoneCode) throw new AppError("conflict", `Row ${input.position} is ${row.stoneCode} already.`);
    if (!parcel.itemId) throw new AppError("conflict", "Say first which item of a take-in this parcel is.");
    const mark = cells[parcel.columns.indexOf("mark")] ?? "";
    const { stone, isAdded } = await findStone(scope, { itemId: parcel.itemId, mark });
    const [linked] = await tx
      .update(parcelRows)
      .set({ stoneId: stone.id })
      .where(and(eq(parcelRows.laboratoryId, laboratoryId), eq(parcelRows.parcelId, parcelId), eq(parcelRows.position, input.position), sql`${parcelRows.stoneId} is null`));
    if (linked.affectedRows !== 1) throw new AppError("conflict", `Row ${input.position} was made a stone already.`);
    const drafts = rowReadings(cells, { columns: parcel.columns, waterTempC: parcel.waterTempC, waterTempText: parcel.waterTempC === null ? "" : String(parcel.waterTempC) }, input);
    const note = `Parcel “${parcel.name}”, row ${input.position}${mark ? `, mark ${mark}` : ""}, as typed ${parcel.savedAt.toISOString().slice(0, 10)}`;
    for (const draft of drafts) {
      try {
        await recordReading(scope, { requestId: newId<"observation">(), stoneCode: stone.code, instrumentId: instrumentOf(draft.kind, input), noResultReason: "", note, areCandidatesHidden: false, draft });
      } catch (error) {
        throw asRowProblem(error, draft.kind);
      }
    }
    await recordAudit(scope, { action: "parcel.stoneOpened", subject: { kind: "parcel", id: parcelId }, detail: { row: input.position, stoneCode: stone.code, isAdded } });
    return { stoneCode: stone.code, isAdded };
  });
}

function instrumentOf(kind: ObservationKind, { refractometerId, balanceId, polariscopeId }: OpenParcelStone): InstrumentId | null {
  const needed = instrumentKindFor[kind];
  return needed === "refractometer" ? refractometerId : needed === "balance" ? balanceId : needed === "polariscope" ? polariscopeId : null;
}

/** The reading's refusal, told at the field of the parcel's page that it is about. */
function asRowProblem(error: unknown, kind: ObservationKind): unknown {
  if (!(error instanceof AppError)) return error;
  const message = `${observationKindNames[kind]}: ${error.userMessage}`;
  const field = error.fieldErrors.instrument ? instrumentKindFor[kind] : undefined;
  return new AppError(error.code, message, { cause: error, fieldErrors: field ? { [field]: [message] } : {} });
}

type FoundStone = { stone: { id: StoneId; code: string }; isAdded: boolean };

async function findStone(ctx: LabContext, { itemId, mark }: { itemId: ItemId; mark: string }): Promise<FoundStone> {
  const { db, laboratoryId, actorId, now } = ctx;
  const [item] = await db.select({ number: items.number, mount: items.mount }).from(items).where(and(eq(items.laboratoryId, laboratoryId), eq(items.id, itemId))).for("update");
  if (!item) throw new AppError("not_found", "There is no such item.");
  if (item.mount !== "loose") throw new AppError("conflict", "Stones of a parcel are loose; this item is set or strung.");
  const all = await db.select().from(stones).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.itemId, itemId))).orderBy(asc(stones.sequence)).for("update");
  const free = all.filter(({ observationCount, examinationState }) => observationCount === 0 && examinationState === "received");
  const chosen = free.find(({ sequence }) => String(sequence) === mark) ?? free[0];
  if (chosen) return { stone: chosen, isAdded: false };
  const sibling = all.at(-1);
  if (!sibling) throw new AppError("conflict", "This item has no stones to examine.");
  if (all.every(({ goodsState }) => goodsState === "released")) throw new AppError("conflict", "These goods have been released: nothing more can be read from them.");
  const id = newId<"stone">();
  const sequence = sibling.sequence + 1;
  const code = `${item.number}-${sequence}`;
  const { takeInId, clientId, description, goodsState, place, holderId, isValuationOrdered, receivedAt, dueOn } = sibling;
  await db.insert(stones).values({
    laboratoryId, id, takeInId, itemId, clientId, code, sequence, description, examinationState: "received", examinationStateAt: now, goodsState, place, holderId, isMounted: false, isValuationOrdered, receivedAt, dueOn,
  });
  const why = "Opened from a parcel";
  await db.insert(stoneEvents).values((["examination", "goods"] as const).map((machine) => ({ laboratoryId, id: newId<"stoneEvent">(), stoneId: id, machine, fromState: null, toState: machine === "goods" ? goodsState : "received", why, at: now, by: actorId })));
  await indexStoneSearch(ctx, [id]);
  return { stone: { id, code }, isAdded: true };
}
