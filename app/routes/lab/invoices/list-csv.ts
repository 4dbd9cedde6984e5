import { listInvoices, type InvoiceCursor } from "#app/features/invoices/list-invoices.server.ts";
import { invoiceStates } from "#app/domain/invoice-state.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const state = invoiceStates.find((known) => known === url.searchParams.get("state"));
  // The first page is asked for here, so that a refusal is an answer and not a broken download.
  let page = await orResponse(listInvoices(ctx, { state, limit: 500 }));
  async function* rows() {
    for (;;) {
      for (const row of page.invoices) yield [row.number, row.issuedOn, row.clientName, row.state, String(row.totalMinor), row.currency];
      const after: InvoiceCursor | undefined = page.nextCursor;
      if (!after) return;
      page = await listInvoices(ctx, { state, after, limit: 500 });
    }
  }
  return csvResponse({ fileName: "invoices.csv", header: ["invoice", "date", "client", "state", "total in minor units", "currency"], rows: rows() });
}
