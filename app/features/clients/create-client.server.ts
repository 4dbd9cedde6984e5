import { and, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients } from "#app/db/schema/index.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { ClientDetails } from "./client-forms.server.ts";

/** @param input.requestId becomes the client's id, so that a form sent twice makes one client */
export async function createClient(ctx: LabContext, { requestId, ...details }: ClientDetails & { requestId: ClientId }): Promise<ClientId> {
  requireRole(ctx, "clients.manage");
  try {
    await inTransaction(ctx.db, async (tx) => {
      await tx.insert(clients).values({ ...details, laboratoryId: ctx.laboratoryId, id: requestId, createdAt: ctx.now });
      await recordAudit({ ...ctx, db: tx }, { action: "client.created", subject: { kind: "client", id: requestId } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db.select({ id: clients.id }).from(clients).where(and(eq(clients.laboratoryId, ctx.laboratoryId), eq(clients.id, requestId)));
    if (!made) throw error;
  }
  return requestId;
}
