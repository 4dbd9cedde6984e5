import { listClients } from "#app/features/clients/list-clients.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const search = (url.searchParams.get("name") ?? "").slice(0, 120);
  // The first page is asked for here, so that a refusal is an answer and not a broken download.
  let page = await orResponse(listClients(ctx, { search, pageSize: 500 }));
  async function* rows() {
    for (;;) {
      for (const client of page.clients) yield [client.name, client.contactName, client.email, client.phone, client.addressLines.join(", "), client.terms];
      if (!page.later) return;
      page = await listClients(ctx, { search, after: page.later, pageSize: 500 });
    }
  }
  return csvResponse({ fileName: "clients.csv", header: ["client", "contact", "e-mail", "telephone", "address", "terms"], rows: rows() });
}
