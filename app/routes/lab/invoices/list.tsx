import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { StateWord, type Tone } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { invoiceStateNames, invoiceStates, type InvoiceState } from "#app/domain/invoice-state.ts";
import { listInvoices } from "#app/features/invoices/list-invoices.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { readCursor, writeCursor } from "#app/web/cursor.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list";

const tones: Record<InvoiceState, Tone> = { open: "straw", paid: "green", refunded: "plain", void: "plain" };

export async function loader({ context, url }: Route.LoaderArgs) {
  const state = invoiceStates.find((known) => known === url.searchParams.get("state"));
  const page = await orResponse(listInvoices(context.get(labContext), { state, after: readCursor<"invoice">(url.searchParams.get("after")) }));
  return { invoices: page.invoices, after: page.nextCursor ? writeCursor(page.nextCursor) : null, state: state ?? null, isFirst: !url.searchParams.has("after") };
}

export const meta: Route.MetaFunction = () => [{ title: "Invoices · Isogyre" }];

export default function InvoicesRoute({ loaderData, params }: Route.ComponentProps) {
  const { invoices, state, after, isFirst } = loaderData;
  const base = `/lab/${params.labSlug}/invoices`;
  return (
    <>
      <PageHeader
        title="Invoices"
        note="Newest first. An invoice is made when goods are taken in."
        actions={
          <a href={`${base}.csv${state ? `?state=${state}` : ""}`} className="text-tint">
            Export CSV
          </a>
        }
      />
      <nav aria-label="State" className="no-print mb-3 flex flex-wrap gap-2">
        {[null, ...invoiceStates].map((choice) => (
          <Link
            key={choice ?? "all"}
            to={choice ? `${base}?state=${choice}` : base}
            aria-current={choice === state ? "page" : undefined}
            className={`rounded-md border px-3 py-1.5 no-underline ${choice === state ? "border-tint bg-tint-bg font-semibold text-tint" : "border-rule-2 bg-sheet text-ink-2"}`}
          >
            {choice ? invoiceStateNames[choice] : "All"}
          </Link>
        ))}
      </nav>
      <Card>
        {invoices.length === 0 ? (
          <EmptyState title={state ? `No ${invoiceStateNames[state].toLowerCase()} invoices` : "No invoices yet"}>{state ? "Choose another state above." : "Take goods in: the fee agreed there becomes the first invoice."}</EmptyState>
        ) : (
          <Table caption="Invoices, newest first">
            <thead>
              <tr>
                <HeaderCell>Invoice</HeaderCell>
                <HeaderCell>Date</HeaderCell>
                <HeaderCell>Client</HeaderCell>
                <HeaderCell>State</HeaderCell>
                <HeaderCell isNumber>Total</HeaderCell>
              </tr>
            </thead>
            <tbody>
              {invoices.map((invoice) => (
                <tr key={invoice.number}>
                  <RowHeaderCell isMono to={`${base}/${invoice.number}`}>
                    {invoice.number}
                  </RowHeaderCell>
                  <Cell className="whitespace-nowrap">{formatCalendarDate(invoice.issuedOn)}</Cell>
                  <Cell>{invoice.clientName}</Cell>
                  <Cell>
                    <StateWord tone={tones[invoice.state]}>{invoiceStateNames[invoice.state]}</StateWord>
                  </Cell>
                  <Cell isNumber>{invoice.total}</Cell>
                </tr>
              ))}
            </tbody>
          </Table>
        )}
      </Card>
      <Pager before={isFirst ? null : ""} after={after} />
    </>
  );
}
