import { and, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { items, parcelRows, parcels } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { isId, type ItemId } from "#app/domain/ids.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import { modelVersion } from "#app/gemmology/ranking/defaults.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { judgeParcel, rankedRow, saysNothing, type RankedRow } from "./judge-parcel.ts";
import { hasProblems, waterTempOf, type ParcelDraft, type ParcelProblems } from "./parcel-draft.ts";
import { readDraft } from "./read-draft.ts";
import type { ReadRow } from "./row-evidence.ts";

export type SavedParcel = { parcelId: ParcelId; problems?: undefined } | { parcelId?: undefined; problems: ParcelProblems };

/**
 * Keeps a table as it was typed, with the ranking of every row by the species table of the day: all of it, or none and
 * what is wrong. Sent twice, it is kept once: the request's id becomes the parcel's.
 */
export async function saveParcel(ctx: LabContext, draft: ParcelDraft): Promise<SavedParcel> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  if (!isId(draft.requestId)) throw new AppError("invalid_input", "This form is not complete. Open it anew and send it again.");
  const { rows, problems } = readDraft(draft);
  const itemId = await findItem(ctx, draft.itemNumber);
  const all: ParcelProblems = itemId === undefined ? { ...problems, fields: { ...problems.fields, itemNumber: "There is no such item here. Its number stands on the receipt: MQ-26-0019." } } : problems;
  if (itemId === undefined || hasProblems(all)) return { problems: all };
  const { table } = loadSpeciesTable();
  const judged = judgeParcel(rows, await rankInTurn(rows, table));
  const parcelId = draft.requestId as ParcelId;
  try {
    await inTransaction(ctx.db, async (tx) => {
      await tx.insert(parcels).values({
        laboratoryId,
        id: parcelId,
        name: draft.name.normalize("NFC").replace(/\s+/g, " ").trim(),
        itemId,
        columns: [...draft.columns],
        waterTempC: waterTempOf(draft.waterTempC),
        rowCount: rows.length,
        oddCount: judged.rows.filter(({ odd }) => odd.length > 0).length,
        mainSpeciesId: judged.main?.speciesId ?? null,
        mainName: judged.main?.name ?? "",
        speciesTableVersion: table.version,
        modelVersion,
        savedAt: now,
        savedBy: actorId,
      });
      await tx.insert(parcelRows).values(judged.rows.map((ranking, at) => ({ laboratoryId, parcelId, position: at + 1, cells: draft.rows[at]!.map((cell) => cell.trim()), ranking })));
      await recordAudit({ ...ctx, db: tx }, { action: "parcel.saved", subject: { kind: "parcel", id: parcelId }, detail: { rows: rows.length } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db.select({ savedBy: parcels.savedBy }).from(parcels).where(and(eq(parcels.laboratoryId, laboratoryId), eq(parcels.id, parcelId)));
    if (made?.savedBy !== actorId) throw error;
  }
  return { parcelId };
}

/** Null: not said. Undefined: there is none of that number. */
async function findItem({ db, laboratoryId }: LabContext, number: string): Promise<ItemId | null | undefined> {
  if (number === "") return null;
  if (!/^[A-Za-z0-9-]{1,24}$/.test(number)) return undefined;
  const [item] = await db.select({ id: items.id }).from(items).where(and(eq(items.laboratoryId, laboratoryId), eq(items.number, number.toUpperCase())));
  return item?.id;
}

/** A row at a time, with the server's other work in between: two hundred rows take a second or two together. */
async function rankInTurn(rows: readonly ReadRow[], table: Parameters<typeof rankSpecies>[1]): Promise<Array<RankedRow | null>> {
  const known = new Map<string, RankedRow>();
  const ranked: Array<RankedRow | null> = [];
  for (const { evidence } of rows) {
    const key = JSON.stringify(evidence);
    const row = saysNothing(evidence) ? null : (known.get(key) ?? rankedRow(rankSpecies(evidence, table)));
    if (row) known.set(key, row);
    ranked.push(row);
    await new Promise((resolve) => setImmediate(resolve));
  }
  return ranked;
}
