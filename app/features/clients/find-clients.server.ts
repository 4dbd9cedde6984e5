import { and, asc, eq, like } from "drizzle-orm";
import { clients } from "#app/db/schema/index.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

export type ClientMatch = { id: ClientId; ref: string; name: string; contactName: string; place: string };
const most = 8;

/** Clients whose name begins with what was typed, by name; the place tells namesakes apart. */
export async function findClients(ctx: LabContext, typed: string): Promise<ClientMatch[]> {
  requireRole(ctx, "clients.read");
  const beginning = typed.normalize("NFC").trim().slice(0, 120);
  if (beginning.length < 2) return [];
  const rows = await ctx.db
    .select({ id: clients.id, name: clients.name, contactName: clients.contactName, addressLines: clients.addressLines })
    .from(clients, { forceIndex: "clients_name" })
    .where(and(eq(clients.laboratoryId, ctx.laboratoryId), like(clients.name, `${escapeLike(beginning)}%`)))
    .orderBy(asc(clients.name), asc(clients.id))
    .limit(most);
  return rows.map(({ addressLines, ...row }) => ({ ...row, ref: shortRef(row.id), place: addressLines.at(-1) ?? "" }));
}

export function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, (character) => `\\${character}`);
}
