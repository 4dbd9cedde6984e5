import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { invoices, payments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { queuePaymentReceipt } from "#app/features/payments/queue-payment-receipt.server.ts";

/** Money taken at the desk or by transfer: the whole invoice, open → paid. */
export async function recordDeskPayment(ctx: LabContext, { number, method, reference }: { number: string; method: "cash" | "transfer"; reference: string }): Promise<void> {
  requireRole(ctx, "invoices.manage");
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const isThis = and(eq(invoices.laboratoryId, ctx.laboratoryId), eq(invoices.number, number));
    const [invoice] = await tx.select({ id: invoices.id, state: invoices.state, totalMinor: invoices.totalMinor, currency: invoices.currency }).from(invoices).where(isThis).for("update");
    if (!invoice) throw new AppError("not_found", "There is no such invoice.");
    if (invoice.state !== "open") throw new AppError("conflict", `Invoice ${number} is already ${invoice.state}. Nothing was recorded.`);
    await tx.insert(payments).values({
      laboratoryId: ctx.laboratoryId,
      id: newId<"payment">(),
      invoiceId: invoice.id,
      kind: "payment",
      method,
      amountMinor: invoice.totalMinor,
      currency: invoice.currency,
      // One desk payment settles one invoice, so its number keeps the reference unique.
      reference: `${number} ${method}`,
      receivedAt: ctx.now,
      recordedBy: ctx.actorId,
    });
    await tx.update(invoices).set({ state: "paid", paidAt: ctx.now }).where(and(isThis, eq(invoices.state, "open")));
    await recordAudit(scope, { action: "invoice.paid", subject: { kind: "invoice", id: invoice.id }, detail: { method, reference } });
    await queuePaymentReceipt(scope, invoice.id);
  });
}
