import { and, asc, eq } from "drizzle-orm";
import { clients, invoiceLines, invoices, payments, takeIns } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatAmount, formatMoney } from "#app/domain/money/format-money.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** One invoice as its page shows it. Two queries. */
export async function getInvoice(ctx: LabContext, { number }: { number: string }) {
  requireRole(ctx, "invoices.read");
  const rows = await ctx.db
    .select({ invoice: invoices, line: invoiceLines, takeInNumber: takeIns.number, clientName: clients.name, clientEmail: clients.email, clientTerms: clients.terms })
    .from(invoices)
    .innerJoin(invoiceLines, and(eq(invoiceLines.laboratoryId, invoices.laboratoryId), eq(invoiceLines.invoiceId, invoices.id)))
    .innerJoin(takeIns, and(eq(takeIns.laboratoryId, invoices.laboratoryId), eq(takeIns.id, invoices.takeInId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .where(and(eq(invoices.laboratoryId, ctx.laboratoryId), eq(invoices.number, number)))
    .orderBy(asc(invoiceLines.position));
  const [first] = rows;
  if (!first) throw new AppError("not_found", "There is no such invoice.");
  const { invoice } = first;
  const { currency } = invoice;
  const movements = await ctx.db
    .select({ kind: payments.kind, method: payments.method, amountMinor: payments.amountMinor, receivedAt: payments.receivedAt })
    .from(payments)
    .where(and(eq(payments.laboratoryId, ctx.laboratoryId), eq(payments.invoiceId, invoice.id)))
    .orderBy(asc(payments.id));
  return {
    number,
    state: invoice.state,
    issuedOn: invoice.issuedOn,
    sentAt: invoice.sentAt,
    paidAt: invoice.paidAt,
    voidReason: invoice.voidReason,
    payUrl: `${ctx.services.publicOrigin}/pay/${invoice.payToken}`,
    takeInNumber: first.takeInNumber,
    clientName: first.clientName,
    clientEmail: first.clientEmail,
    hasAccountTerms: first.clientTerms === "account",
    net: formatAmount({ amountMinor: invoice.netMinor, currency }),
    tax: formatAmount({ amountMinor: invoice.taxMinor, currency }),
    total: formatMoney({ amountMinor: invoice.totalMinor, currency }),
    lines: rows.map(({ line }) => ({
      label: line.label,
      quantity: line.quantity,
      unit: formatAmount({ amountMinor: line.unitMinor, currency }),
      net: formatAmount({ amountMinor: line.netMinor, currency }),
    })),
    movements: movements.map((row) => ({ ...row, amount: formatMoney({ amountMinor: row.amountMinor, currency }) })),
  };
}
