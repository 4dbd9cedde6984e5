import { and, desc, eq, lt, or } from "drizzle-orm";
import { items, parcels, users } from "#app/db/schema/index.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Parcels, the latest first; those of one item where it is named. */
export async function listParcels(ctx: LabContext, { itemNumber, after, limit = 50 }: { itemNumber?: string; after?: { createdAt: Date; id: ParcelId }; limit?: number } = {}) {
  requireRole(ctx, "readings.read");
  const older = after && or(lt(parcels.savedAt, after.createdAt), and(eq(parcels.savedAt, after.createdAt), lt(parcels.id, after.id)));
  const rows = await ctx.db
    .select({ id: parcels.id, name: parcels.name, rowCount: parcels.rowCount, oddCount: parcels.oddCount, mainName: parcels.mainName, savedAt: parcels.savedAt, savedBy: users.name, itemNumber: items.number })
    .from(parcels)
    .innerJoin(users, eq(users.id, parcels.savedBy))
    .leftJoin(items, and(eq(items.laboratoryId, parcels.laboratoryId), eq(items.id, parcels.itemId)))
    .where(and(eq(parcels.laboratoryId, ctx.laboratoryId), itemNumber ? eq(items.number, itemNumber) : undefined, older))
    .orderBy(desc(parcels.savedAt), desc(parcels.id))
    .limit(limit + 1);
  const last = rows.length > limit ? rows[limit - 1] : undefined;
  return { parcels: rows.slice(0, limit).map(({ id, ...row }) => ({ ...row, ref: shortRef(id) })), nextCursor: last ? { createdAt: last.savedAt, id: last.id } : undefined };
}
