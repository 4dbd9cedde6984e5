import { and, desc, eq, sql } from "drizzle-orm";
import { clients, takeIns, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

const takeInsShown = 50;

/** A client with the latest of their take-ins. */
export async function getClient(ctx: LabContext, clientId: ClientId) {
  requireRole(ctx, "clients.read");
  const [client] = await ctx.db
    .select({
      id: clients.id,
      name: clients.name,
      contactName: clients.contactName,
      email: clients.email,
      phone: clients.phone,
      addressLines: clients.addressLines,
      note: clients.note,
      terms: clients.terms,
      termsGrantedAt: clients.termsGrantedAt,
      termsGrantedBy: users.name,
      createdAt: clients.createdAt,
      version: clients.version,
    })
    .from(clients)
    .leftJoin(users, eq(users.id, clients.termsGrantedBy))
    .where(and(eq(clients.laboratoryId, ctx.laboratoryId), eq(clients.id, clientId)));
  if (!client) throw new AppError("not_found", "There is no such client.");
  const theirTakeIns = await ctx.db
    .select({
      number: takeIns.number,
      receivedAt: takeIns.receivedAt,
      dueOn: takeIns.dueOn,
      services: takeIns.services,
      handedOverBy: takeIns.handedOverBy,
      // Names written out: in a select of one table Drizzle leaves the table's name away, and "id" would be the item's.
      items: sql<string>`(select group_concat(i.description order by i.position separator '; ') from items i where i.laboratory_id = take_ins.laboratory_id and i.take_in_id = take_ins.id)`,
    })
    .from(takeIns)
    .where(and(eq(takeIns.laboratoryId, ctx.laboratoryId), eq(takeIns.clientId, clientId)))
    .orderBy(desc(takeIns.receivedAt))
    .limit(takeInsShown);
  return { ...client, ref: shortRef(client.id), takeIns: theirTakeIns };
}
