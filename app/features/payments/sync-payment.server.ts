import { and, eq, sql } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { invoices, payments } from "#app/db/schema/index.ts";
import type { InvoiceId } from "#app/domain/ids.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { queuePaymentReceipt } from "./queue-payment-receipt.server.ts";

/** What the provider says today about one payment: the truth, whatever order its events came in. */
export type PaymentTruth = Readonly<{
  invoiceId: InvoiceId;
  paymentReference: string;
  receivedMinor: number;
  currency: CurrencyCode;
  refunds: ReadonlyArray<{ reference: string; amountMinor: number }>;
}>;

/**
 * Makes the ledger say what the provider says, inside one transaction: each payment and refund is written once by its
 * reference, and the invoice's state follows from the sums alone. Repeating it, in any order, changes nothing.
 * @returns a short word on what changed, for the record of events
 */
export async function syncPayment(scope: LabScope, truth: PaymentTruth): Promise<string> {
  const { db, laboratoryId, now } = scope;
  // Only this row is locked: joined rows of the laboratory would be locked with it.
  const [invoice] = await db
    .select({ id: invoices.id, number: invoices.number, state: invoices.state, totalMinor: invoices.totalMinor, currency: invoices.currency })
    .from(invoices)
    .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, truth.invoiceId)))
    .for("update");
  if (!invoice) return "no such invoice";
  if (invoice.currency !== truth.currency) {
    await recordAudit(scope, { action: "payment.wrongCurrency", subject: { kind: "invoice", id: invoice.id }, detail: { reference: truth.paymentReference, currency: truth.currency } });
    return "wrong currency: needs a person";
  }

  const rows = [
    ...(truth.receivedMinor > 0 ? [{ kind: "payment" as const, reference: truth.paymentReference, amountMinor: truth.receivedMinor }] : []),
    ...truth.refunds.map((refund) => ({ kind: "refund" as const, reference: refund.reference, amountMinor: -refund.amountMinor })),
  ];
  let written = 0;
  for (const row of rows) {
    const [result] = await db
      .insert(payments)
      .values({ laboratoryId, id: newId<"payment">(), invoiceId: invoice.id, method: "card", currency: truth.currency, receivedAt: now, recordedBy: scope.actorId, ...row })
      // The reference is unique: a repeat leaves the row as it is and counts as no change.
      .onDuplicateKeyUpdate({ set: { reference: sql`${payments.reference}` } });
    if (result.affectedRows === 1) written++;
  }

  const sums = await db
    .select({ kind: payments.kind, amountMinor: sql<string>`sum(${payments.amountMinor})` })
    .from(payments)
    .where(and(eq(payments.laboratoryId, laboratoryId), eq(payments.invoiceId, invoice.id)))
    .groupBy(payments.kind);
  const sumOf = (kind: "payment" | "refund") => Number(sums.find((sum) => sum.kind === kind)?.amountMinor ?? 0);
  const received = sumOf("payment");
  const refunded = -sumOf("refund");

  if (invoice.state === "open" && received >= invoice.totalMinor) {
    await db
      .update(invoices)
      .set({ state: "paid", paidAt: now })
      .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, invoice.id), eq(invoices.state, "open")));
    await recordAudit(scope, { action: "invoice.paid", subject: { kind: "invoice", id: invoice.id }, detail: { reference: truth.paymentReference } });
    await queuePaymentReceipt(scope, invoice.id);
  } else if (written > 0 && truth.receivedMinor > 0 && invoice.state !== "open" && received > invoice.totalMinor) {
    await recordAudit(scope, { action: "payment.unexpected", subject: { kind: "invoice", id: invoice.id }, detail: { reference: truth.paymentReference, state: invoice.state } });
  }
  if (received > 0 && refunded >= received) {
    const [result] = await db
      .update(invoices)
      .set({ state: "refunded" })
      .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, invoice.id), eq(invoices.state, "paid")));
    if (result.affectedRows === 1) await recordAudit(scope, { action: "invoice.refunded", subject: { kind: "invoice", id: invoice.id }, detail: { refundedMinor: refunded } });
  }
  return written === 0 ? "nothing new" : `wrote ${written}`;
}
