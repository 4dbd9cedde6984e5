import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, invoices, takeIns } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { invoiceToPayEmail } from "#app/emails/invoice-to-pay-email.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Mails the pay link of an open invoice to the client. Asked again within the same minute, it sends nothing more. */
export async function sendInvoice(ctx: LabContext, { number }: { number: string }): Promise<{ to: string }> {
  requireRole(ctx, "invoices.manage");
  const { laboratoryId, laboratory } = ctx;
  const [invoice] = await ctx.db
    .select({
      id: invoices.id,
      state: invoices.state,
      totalMinor: invoices.totalMinor,
      currency: invoices.currency,
      issuedOn: invoices.issuedOn,
      payToken: invoices.payToken,
      takeInNumber: takeIns.number,
      clientName: clients.name,
      clientEmail: clients.email,
    })
    .from(invoices)
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .innerJoin(takeIns, and(eq(takeIns.laboratoryId, invoices.laboratoryId), eq(takeIns.id, invoices.takeInId)))
    .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.number, number)));
  if (!invoice) throw new AppError("not_found", "There is no such invoice.");
  if (invoice.state !== "open") throw new AppError("conflict", `Invoice ${number} is ${invoice.state}; there is nothing to pay.`);
  if (!invoice.clientEmail) throw new AppError("conflict", `${invoice.clientName} has no e-mail address. Add one, or take the payment at the desk.`);

  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    await queueMail(scope, {
      laboratoryId,
      to: { address: invoice.clientEmail, name: invoice.clientName },
      kind: "invoiceToPay",
      dedupeKey: `invoice-to-pay:${invoice.id}:${Math.floor(ctx.now.getTime() / 60_000)}`,
      message: invoiceToPayEmail({
        laboratoryName: laboratory.name,
        recipientName: invoice.clientName,
        invoiceNumber: number,
        takeInNumber: invoice.takeInNumber,
        total: formatMoney({ amountMinor: invoice.totalMinor, currency: invoice.currency }),
        issuedOn: formatCalendarDate(invoice.issuedOn),
        payUrl: `${ctx.services.publicOrigin}/pay/${invoice.payToken}`,
      }),
    });
    await tx.update(invoices).set({ sentAt: ctx.now }).where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, invoice.id)));
    await recordAudit(scope, { action: "invoice.sent", subject: { kind: "invoice", id: invoice.id } });
  });
  return { to: invoice.clientEmail };
}
