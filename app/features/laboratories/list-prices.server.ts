import { asc, eq } from "drizzle-orm";
import { prices } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** What each service costs, in the order of the list. */
export async function listPrices(ctx: LabContext) {
  requireRole(ctx, "prices.read");
  return ctx.db
    .select({ service: prices.service, label: prices.label, amountMinor: prices.amountMinor, isActive: prices.isActive, changedAt: prices.changedAt })
    .from(prices)
    .where(eq(prices.laboratoryId, ctx.laboratoryId))
    .orderBy(asc(prices.position), asc(prices.id));
}
