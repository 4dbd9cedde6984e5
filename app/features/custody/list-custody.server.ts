import { aliasedTable, and, asc, eq } from "drizzle-orm";
import { custodyEvents, items, users } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Every hand-over of an item, oldest first. */
export async function listCustody(ctx: LabContext, itemNumber: string) {
  requireRole(ctx, "takeIn.read");
  const holders = aliasedTable(users, "holders");
  return ctx.db
    .select({
      sequence: custodyEvents.sequence,
      purpose: custodyEvents.purpose,
      fromPlace: custodyEvents.fromPlace,
      toPlace: custodyEvents.toPlace,
      holder: holders.name,
      massText: custodyEvents.massText,
      massUnit: custodyEvents.massUnit,
      seal: custodyEvents.seal,
      remark: custodyEvents.remark,
      at: custodyEvents.at,
      by: users.name,
    })
    .from(items)
    .innerJoin(custodyEvents, and(eq(custodyEvents.laboratoryId, items.laboratoryId), eq(custodyEvents.itemId, items.id)))
    .innerJoin(users, eq(users.id, custodyEvents.by))
    .leftJoin(holders, eq(holders.id, custodyEvents.holderId))
    .where(and(eq(items.laboratoryId, ctx.laboratoryId), eq(items.number, itemNumber)))
    .orderBy(asc(custodyEvents.sequence));
}
