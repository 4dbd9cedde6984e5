import { and, desc, eq, lt, or, type SQL } from "drizzle-orm";
import { clients, invoices } from "#app/db/schema/index.ts";
import type { InvoiceId } from "#app/domain/ids.ts";
import type { InvoiceState } from "#app/domain/invoice-state.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

const pageSize = 50;
export type InvoiceCursor = { createdAt: Date; id: InvoiceId };

/** Newest first, 50 at a time; for the next page pass `nextCursor` as `after`. */
export async function listInvoices(ctx: LabContext, { state, after, limit = pageSize }: { state?: InvoiceState; after?: InvoiceCursor; limit?: number }) {
  requireRole(ctx, "invoices.read");
  const older: SQL | undefined = after && or(lt(invoices.createdAt, after.createdAt), and(eq(invoices.createdAt, after.createdAt), lt(invoices.id, after.id)));
  const rows = await ctx.db
    .select({
      id: invoices.id,
      number: invoices.number,
      state: invoices.state,
      totalMinor: invoices.totalMinor,
      currency: invoices.currency,
      issuedOn: invoices.issuedOn,
      createdAt: invoices.createdAt,
      clientName: clients.name,
    })
    .from(invoices)
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .where(and(eq(invoices.laboratoryId, ctx.laboratoryId), state && eq(invoices.state, state), older))
    .orderBy(desc(invoices.createdAt), desc(invoices.id))
    .limit(limit + 1);
  const page = rows.slice(0, limit);
  const last = rows.length > limit ? page.at(-1) : undefined;
  return {
    invoices: page.map(({ id: _id, createdAt: _at, ...row }) => ({ ...row, total: formatMoney({ amountMinor: row.totalMinor, currency: row.currency }) })),
    nextCursor: last ? { createdAt: last.createdAt, id: last.id } : undefined,
  };
}
