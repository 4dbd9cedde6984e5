import { and, asc, eq } from "drizzle-orm";
import { items, parcelRows, parcels, stones, takeIns, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** A parcel with its rows as they were typed and ranked, in two queries. */
export async function getParcel(ctx: LabContext, parcelId: ParcelId) {
  requireRole(ctx, "readings.read");
  const { db, laboratoryId } = ctx;
  const [[parcel], rows] = await Promise.all([
    db
      .select({ parcel: parcels, savedBy: users.name, itemNumber: items.number, itemDescription: items.description, mount: items.mount, takeInNumber: takeIns.number })
      .from(parcels)
      .innerJoin(users, eq(users.id, parcels.savedBy))
      .leftJoin(items, and(eq(items.laboratoryId, parcels.laboratoryId), eq(items.id, parcels.itemId)))
      .leftJoin(takeIns, and(eq(takeIns.laboratoryId, items.laboratoryId), eq(takeIns.id, items.takeInId)))
      .where(and(eq(parcels.laboratoryId, laboratoryId), eq(parcels.id, parcelId))),
    db
      .select({ position: parcelRows.position, cells: parcelRows.cells, ranking: parcelRows.ranking, stoneCode: stones.code })
      .from(parcelRows)
      .leftJoin(stones, and(eq(stones.laboratoryId, parcelRows.laboratoryId), eq(stones.id, parcelRows.stoneId)))
      .where(and(eq(parcelRows.laboratoryId, laboratoryId), eq(parcelRows.parcelId, parcelId)))
      .orderBy(asc(parcelRows.position)),
  ]);
  if (!parcel) throw new AppError("not_found", "There is no such parcel.");
  const { laboratoryId: _, id, itemId: __, savedBy: ___, ...fields } = parcel.parcel;
  return {
    ...fields,
    ref: shortRef(id),
    savedBy: parcel.savedBy,
    item: parcel.itemNumber === null ? null : { number: parcel.itemNumber, description: parcel.itemDescription, mount: parcel.mount, takeInNumber: parcel.takeInNumber },
    rows,
  };
}

export type ParcelView = Awaited<ReturnType<typeof getParcel>>;
