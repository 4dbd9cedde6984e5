import { Form, Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { inputLook } from "#app/components/ui/field-frame.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { isAllowed } from "#app/domain/permissions.ts";
import { listClients } from "#app/features/clients/list-clients.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { readRefCursor, writeRefCursor } from "#app/web/ref-cursor.ts";
import type { Route } from "./+types/list";

const anyName = /^.{0,120}$/su;

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const cursor = (name: string) => {
    const found = readRefCursor<"client">(url.searchParams.get(name), anyName);
    return found && { name: found.key, id: found.id };
  };
  const search = (url.searchParams.get("name") ?? "").slice(0, 120);
  const page = await orResponse(listClients(ctx, { search, after: cursor("after"), before: cursor("before") }));
  const written = (at: typeof page.later) => at && writeRefCursor({ key: at.name, id: at.id });
  return { clients: page.clients, before: written(page.earlier), after: written(page.later), search, canManage: isAllowed(ctx.roles, "clients.manage") };
}

export const meta: Route.MetaFunction = () => [{ title: "Clients · Isogyre" }];

export default function ClientsRoute({ loaderData, params }: Route.ComponentProps) {
  const { clients, before, after, search, canManage } = loaderData;
  const base = `/lab/${params.labSlug}/clients`;
  const newClient = canManage ? (
    <LinkButton look="primary" to={`${base}/new`}>
      New client
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader
        title="Clients"
        note="By name."
        actions={
          <>
            <a href={`${base}.csv${search ? `?name=${encodeURIComponent(search)}` : ""}`} className="px-1 text-tint">
              Export CSV
            </a>
            {newClient}
          </>
        }
      />
      <Form className="no-print mb-3 flex flex-wrap items-end gap-2.5" role="search" aria-label="Find a client" key={search}>
        <div className="w-64">
          <label htmlFor="client-name" className="mb-1 block text-[12.5px] font-semibold text-ink-2">
            Name begins with
          </label>
          <input id="client-name" type="search" name="name" defaultValue={search} maxLength={120} className={inputLook} />
        </div>
        <Button look="quiet">Show</Button>
        {search ? (
          <Link to={base} className="self-center px-1 text-ink-2">
            Clear
          </Link>
        ) : null}
      </Form>
      <Card>
        {clients.length === 0 ? (
          search ? (
            <EmptyState title="No such client" action={<LinkButton to={base}>Show all clients</LinkButton>}>
              No name begins with “{search}”.
            </EmptyState>
          ) : (
            <EmptyState title="No clients yet" action={newClient}>
              A client is whoever owns or brings the goods. The first one can also be made while goods are taken in.
            </EmptyState>
          )
        ) : (
          <Table caption="Clients by name">
            <thead>
              <tr>
                <HeaderCell>Client</HeaderCell>
                <HeaderCell>Contact</HeaderCell>
                <HeaderCell>E-mail</HeaderCell>
                <HeaderCell>Telephone</HeaderCell>
                <HeaderCell>Place</HeaderCell>
                <HeaderCell>Terms</HeaderCell>
              </tr>
            </thead>
            <tbody>
              {clients.map((client) => (
                <tr key={client.id}>
                  <RowHeaderCell to={`${base}/${client.ref}`}>{client.name}</RowHeaderCell>
                  <Cell>{client.contactName}</Cell>
                  <Cell>{client.email}</Cell>
                  <Cell className="whitespace-nowrap">{client.phone}</Cell>
                  <Cell>{client.addressLines.at(-1) ?? ""}</Cell>
                  <Cell>{client.terms === "account" ? "Account" : "Before issue"}</Cell>
                </tr>
              ))}
            </tbody>
          </Table>
        )}
      </Card>
      <Pager before={before} after={after} />
    </>
  );
}
