import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { prices } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { serviceCodes, type ServiceCode } from "#app/domain/take-in.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { priceListMark, type ListedPrice } from "./price-list-mark.ts";

/**
 * Sets the price list. Fixed amounts only: a fee never depends on a value (workflow 1.1). What was agreed at take-in keeps
 * its fee. `before` is the list as the page showed it.
 */
export async function updatePrices(ctx: LabContext, { changes, before }: { changes: readonly ListedPrice[]; before: string }): Promise<void> {
  requireRole(ctx, "prices.manage");
  await inTransaction(ctx.db, async (tx) => {
    const rows = await tx.select().from(prices).where(eq(prices.laboratoryId, ctx.laboratoryId)).for("update");
    if (priceListMark(rows) !== before) {
      throw new AppError("conflict", "Somebody has changed the price list since you opened the page. What you typed is still here: open the page anew beside it, compare, and save there.");
    }
    const changed: ServiceCode[] = [];
    for (const { service, ...change } of changes) {
      const row = rows.find((candidate) => candidate.service === service);
      if (row && row.label === change.label && row.amountMinor === change.amountMinor && row.isActive === change.isActive) continue;
      changed.push(service);
      const stamp = { changedAt: ctx.now, changedBy: ctx.actorId };
      if (row) await tx.update(prices).set({ ...change, ...stamp }).where(and(eq(prices.laboratoryId, ctx.laboratoryId), eq(prices.id, row.id)));
      else await tx.insert(prices).values({ laboratoryId: ctx.laboratoryId, id: newId<"price">(), service, ...change, ...stamp, position: serviceCodes.indexOf(service) + 1 });
    }
    if (changed.length > 0) await recordAudit({ ...ctx, db: tx }, { action: "prices.changed", subject: { kind: "laboratory", id: ctx.laboratoryId }, detail: { services: changed } });
  });
}
