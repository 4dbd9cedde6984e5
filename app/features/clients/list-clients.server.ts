import { and, asc, desc, eq, gt, like, lt, or } from "drizzle-orm";
import { clients } from "#app/db/schema/index.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { escapeLike } from "./find-clients.server.ts";

export type ClientListItem = {
  id: ClientId;
  ref: string;
  name: string;
  contactName: string;
  email: string;
  phone: string;
  addressLines: string[];
  terms: "prepaid" | "account";
  createdAt: Date;
};
export type ClientCursor = { name: string; id: ClientId };
export type ClientPage = { clients: ClientListItem[]; earlier: ClientCursor | null; later: ClientCursor | null };

/** By name, a page at a time, both ways. `search` is the beginning of a name. */
export async function listClients(
  ctx: LabContext,
  { search = "", after, before, pageSize = 50 }: { search?: string; after?: ClientCursor; before?: ClientCursor; pageSize?: number } = {},
): Promise<ClientPage> {
  requireRole(ctx, "clients.read");
  const beginning = search.normalize("NFC").trim().slice(0, 120);
  const isBackward = before !== undefined;
  const past = isBackward
    ? or(lt(clients.name, before.name), and(eq(clients.name, before.name), lt(clients.id, before.id)))
    : after && or(gt(clients.name, after.name), and(eq(clients.name, after.name), gt(clients.id, after.id)));
  const rows = await ctx.db
    .select({
      id: clients.id,
      name: clients.name,
      contactName: clients.contactName,
      email: clients.email,
      phone: clients.phone,
      addressLines: clients.addressLines,
      terms: clients.terms,
      createdAt: clients.createdAt,
    })
    .from(clients, { forceIndex: "clients_name" })
    .where(
      and(
        eq(clients.laboratoryId, ctx.laboratoryId),
        beginning === "" ? undefined : like(clients.name, `${escapeLike(beginning)}%`),
        past,
      ),
    )
    .orderBy(isBackward ? desc(clients.name) : asc(clients.name), isBackward ? desc(clients.id) : asc(clients.id))
    .limit(pageSize + 1);
  const hasMore = rows.length > pageSize;
  const page = rows.slice(0, pageSize);
  if (isBackward) page.reverse();
  const cursor = (row: { name: string; id: ClientId } | undefined) => (row ? { name: row.name, id: row.id } : null);
  return {
    clients: page.map((row) => ({ ...row, ref: shortRef(row.id) })),
    earlier: (isBackward ? hasMore : after !== undefined) ? cursor(page[0]) : null,
    later: (isBackward || hasMore) ? cursor(page.at(-1)) : null,
  };
}
