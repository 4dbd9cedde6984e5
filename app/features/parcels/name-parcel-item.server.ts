import { and, eq, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { items, parcels } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Says which item of a take-in a parcel is; once. */
export async function nameParcelItem(ctx: LabContext, parcelId: ParcelId, { itemNumber }: { itemNumber: string }): Promise<void> {
  requireRole(ctx, "readings.record");
  const { laboratoryId } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const mine = and(eq(parcels.laboratoryId, laboratoryId), eq(parcels.id, parcelId));
    const [parcel] = await tx.select({ itemId: parcels.itemId }).from(parcels).where(mine).for("update");
    if (!parcel) throw new AppError("not_found", "There is no such parcel.");
    if (parcel.itemId !== null) throw new AppError("conflict", "It was said already which item this parcel is.");
    const [item] = await tx.select({ id: items.id }).from(items).where(and(eq(items.laboratoryId, laboratoryId), eq(items.number, itemNumber.trim().toUpperCase())));
    const message = "There is no such item here. Its number stands on the receipt: MQ-26-0019.";
    if (!item) throw new AppError("invalid_input", message, { fieldErrors: { itemNumber: [message] } });
    await tx.update(parcels).set({ itemId: item.id }).where(and(mine, isNull(parcels.itemId)));
    await recordAudit({ ...ctx, db: tx }, { action: "parcel.itemNamed", subject: { kind: "parcel", id: parcelId }, detail: { itemNumber: itemNumber.trim() } });
  });
}
