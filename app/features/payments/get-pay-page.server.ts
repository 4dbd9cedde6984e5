import { and, asc, eq } from "drizzle-orm";
import { clients, invoiceLines, invoices, laboratories } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatAmount, formatMoney } from "#app/domain/money/format-money.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** What the holder of a pay link sees of one invoice: no other, and nothing of the goods. */
export async function getPayPage(app: AppContext, { payToken }: { payToken: string }) {
  const rows = await app.db
    .select({
      number: invoices.number,
      state: invoices.state,
      currency: invoices.currency,
      netMinor: invoices.netMinor,
      taxMinor: invoices.taxMinor,
      totalMinor: invoices.totalMinor,
      issuedOn: invoices.issuedOn,
      paidAt: invoices.paidAt,
      clientName: clients.name,
      laboratoryName: laboratories.name,
      laboratoryAddress: laboratories.addressLines,
      taxLabel: laboratories.taxLabel,
      timeZone: laboratories.timeZone,
      label: invoiceLines.label,
      quantity: invoiceLines.quantity,
      lineNetMinor: invoiceLines.netMinor,
    })
    .from(invoices)
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .innerJoin(laboratories, eq(laboratories.id, invoices.laboratoryId))
    .innerJoin(invoiceLines, and(eq(invoiceLines.laboratoryId, invoices.laboratoryId), eq(invoiceLines.invoiceId, invoices.id)))
    .where(eq(invoices.payToken, payToken))
    .orderBy(asc(invoiceLines.position));
  const [first] = rows;
  if (!first) throw new AppError("not_found", "This payment link is not valid. Ask the laboratory for a new one.");
  const { currency } = first;
  return {
    number: first.number,
    state: first.state,
    issuedOn: first.issuedOn,
    paidAt: first.paidAt,
    timeZone: first.timeZone,
    clientName: first.clientName,
    laboratoryName: first.laboratoryName,
    laboratoryAddress: first.laboratoryAddress,
    taxLabel: first.taxLabel,
    net: formatAmount({ amountMinor: first.netMinor, currency }),
    tax: formatAmount({ amountMinor: first.taxMinor, currency }),
    total: formatMoney({ amountMinor: first.totalMinor, currency }),
    lines: rows.map((row) => ({ label: row.label, quantity: row.quantity, net: formatAmount({ amountMinor: row.lineNetMinor, currency }) })),
  };
}
