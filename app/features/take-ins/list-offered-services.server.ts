import { and, asc, eq } from "drizzle-orm";
import { prices } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** The services on offer and their prices: what a fee is agreed from. */
export async function listOfferedServices(ctx: LabContext) {
  requireRole(ctx, "prices.read");
  return ctx.db
    .select({ service: prices.service, label: prices.label, amountMinor: prices.amountMinor })
    .from(prices)
    .where(and(eq(prices.laboratoryId, ctx.laboratoryId), eq(prices.isActive, true)))
    .orderBy(asc(prices.position));
}
