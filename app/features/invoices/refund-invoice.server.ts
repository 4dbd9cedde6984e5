import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { invoices, payments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { syncPayment } from "#app/features/payments/sync-payment.server.ts";

/** Gives back all that was received for an invoice: cards through the provider, desk payments by hand at the desk. */
export async function refundInvoice(ctx: LabContext, { number, reason }: { number: string; reason: string }): Promise<void> {
  requireRole(ctx, "invoices.manage");
  const { db, laboratoryId } = ctx;
  const [invoice] = await db
    .select({ id: invoices.id, state: invoices.state, currency: invoices.currency })
    .from(invoices)
    .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.number, number)));
  if (!invoice) throw new AppError("not_found", "There is no such invoice.");
  if (invoice.state !== "paid") throw new AppError("conflict", `Invoice ${number} is ${invoice.state}; there is nothing to give back.`);
  const received = await db
    .select({ method: payments.method, reference: payments.reference, amountMinor: payments.amountMinor })
    .from(payments)
    .where(and(eq(payments.laboratoryId, laboratoryId), eq(payments.invoiceId, invoice.id), eq(payments.kind, "payment")));

  for (const payment of received) {
    const refund = payment.method === "card" ? await refundCard(ctx, payment.reference) : { reference: `${payment.reference} back`, amountMinor: payment.amountMinor };
    await inTransaction(db, async (tx) => {
      const scope = { ...ctx, db: tx };
      if (payment.method !== "card") {
        await tx.insert(payments).values({
          laboratoryId, id: newId<"payment">(), invoiceId: invoice.id, kind: "refund", method: payment.method,
          amountMinor: -refund.amountMinor, currency: invoice.currency, reference: refund.reference, receivedAt: ctx.now, recordedBy: ctx.actorId,
        });
      }
      await syncPayment(scope, {
        invoiceId: invoice.id,
        paymentReference: payment.reference,
        receivedMinor: payment.method === "card" ? payment.amountMinor : 0,
        currency: invoice.currency,
        refunds: payment.method === "card" ? [refund] : [],
      });
      await recordAudit(scope, { action: "invoice.refundAsked", subject: { kind: "invoice", id: invoice.id }, reason });
    });
  }
}

/** The key is the payment itself: asked twice, it is given back once. */
async function refundCard(ctx: LabContext, paymentIntent: string): Promise<{ reference: string; amountMinor: number }> {
  try {
    const refund = await ctx.services.stripe.refunds.create({ payment_intent: paymentIntent }, { idempotencyKey: `refund-${paymentIntent}` });
    return { reference: refund.id, amountMinor: refund.amount };
  } catch (error) {
    throw new AppError("unavailable", "The payment service did not take the refund. Nothing was given back. Try again in a minute.", { cause: error, retryAfterS: 60 });
  }
}
