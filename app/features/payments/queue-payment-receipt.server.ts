import { and, eq } from "drizzle-orm";
import { clients, invoices, laboratories } from "#app/db/schema/index.ts";
import type { InvoiceId } from "#app/domain/ids.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { paymentReceivedEmail } from "#app/emails/payment-received-email.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";

/** The receipt of a paid invoice, to the client's address if there is one. */
export async function queuePaymentReceipt(scope: LabScope, invoiceId: InvoiceId): Promise<void> {
  const { db, laboratoryId } = scope;
  const [invoice] = await db
    .select({
      number: invoices.number,
      totalMinor: invoices.totalMinor,
      currency: invoices.currency,
      payToken: invoices.payToken,
      clientName: clients.name,
      clientEmail: clients.email,
      laboratoryName: laboratories.name,
    })
    .from(invoices)
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .innerJoin(laboratories, eq(laboratories.id, invoices.laboratoryId))
    .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, invoiceId)));
  if (!invoice?.clientEmail) return;
  await queueMail(scope, {
    laboratoryId,
    to: { address: invoice.clientEmail, name: invoice.clientName },
    kind: "paymentReceived",
    dedupeKey: `payment-received:${invoiceId}`,
    message: paymentReceivedEmail({
      laboratoryName: invoice.laboratoryName,
      recipientName: invoice.clientName,
      invoiceNumber: invoice.number,
      total: formatMoney({ amountMinor: invoice.totalMinor, currency: invoice.currency }),
      url: `${scope.services.publicOrigin}/pay/${invoice.payToken}`,
    }),
  });
}
