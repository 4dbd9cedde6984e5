import { findClients } from "#app/features/clients/find-clients.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/find";

/** What the take-in page offers while a name is typed. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const typed = url.searchParams.get("q") ?? "";
  const clients = await orResponse(findClients(context.get(labContext), typed));
  return { typed, clients: clients.map(({ ref, name, contactName, place }) => ({ ref, name, contactName, place })) };
}
