import { and, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { indexStoneSearch } from "#app/features/stones/index-stone-search.server.ts";
import type { ClientDetails } from "./client-forms.server.ts";

/** Changes a client's details, unless somebody changed them since this version was read. */
export async function updateClient(ctx: LabContext, clientId: ClientId, { version, ...details }: ClientDetails & { version: number }): Promise<void> {
  requireRole(ctx, "clients.manage");
  await inTransaction(ctx.db, async (tx) => {
    const mine = and(eq(clients.laboratoryId, ctx.laboratoryId), eq(clients.id, clientId));
    const [before] = await tx.select({ name: clients.name, version: clients.version }).from(clients).where(mine).for("update");
    if (!before) throw new AppError("not_found", "There is no such client.");
    if (before.version !== version) {
      throw new AppError("conflict", "Somebody has changed this client since you opened the page. What you typed is still here: compare it with the client's page, then save again.");
    }
    await tx.update(clients).set({ ...details, version: sql`${clients.version} + 1` }).where(mine);
    await recordAudit({ ...ctx, db: tx }, { action: "client.changed", subject: { kind: "client", id: clientId } });
    if (before.name !== details.name) {
      const theirs = await tx.select({ id: stones.id }).from(stones).where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.clientId, clientId)));
      for (let at = 0; at < theirs.length; at += 200) await indexStoneSearch({ ...ctx, db: tx }, theirs.slice(at, at + 200).map((stone) => stone.id));
    }
  });
}
