import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, invoices, items, takeIns } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { Release } from "./custody-forms.server.ts";
import { moveGoods } from "./move-goods.server.ts";

/** Gives an item back: to whom, known by what, weighed, its condition agreed, and nothing left unpaid. */
export async function releaseItem(ctx: LabContext, { collectedBy, idSeen, isConditionAgreed, remark, ...input }: Release): Promise<void> {
  requireRole(ctx, "custody.release");
  if (!isConditionAgreed) {
    const message = "Look at the item together with whoever collects it, and agree on its condition.";
    throw new AppError("invalid_input", message, { fieldErrors: { isConditionAgreed: [message] } });
  }
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const rows = await tx
      .select({ number: invoices.number, state: invoices.state, terms: clients.terms })
      .from(items)
      .innerJoin(takeIns, and(eq(takeIns.laboratoryId, items.laboratoryId), eq(takeIns.id, items.takeInId)))
      .innerJoin(clients, and(eq(clients.laboratoryId, takeIns.laboratoryId), eq(clients.id, takeIns.clientId)))
      .leftJoin(invoices, and(eq(invoices.laboratoryId, takeIns.laboratoryId), eq(invoices.takeInId, takeIns.id)))
      .where(and(eq(items.laboratoryId, ctx.laboratoryId), eq(items.number, input.itemNumber)));
    const unpaid = rows.find((row) => row.state === "open" && row.terms !== "account");
    const { isRepeat } = await moveGoods(scope, {
      ...input,
      purpose: "release",
      toPlace: collectedBy,
      holderId: null,
      remark: [`Known by: ${idSeen}. Condition agreed.`, remark].filter(Boolean).join(" "),
      explanation: remark,
    });
    if (unpaid && !isRepeat) {
      throw new AppError("conflict", `Invoice ${unpaid.number} is not paid. Take the payment first; an owner can also give this client account terms.`);
    }
  });
}
