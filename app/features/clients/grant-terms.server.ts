import { and, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Lets a client's reports be issued and goods released before they are paid, or ends that. */
export async function grantTerms(ctx: LabContext, clientId: ClientId, { terms, version }: { terms: "prepaid" | "account"; version: number }): Promise<void> {
  requireRole(ctx, "clients.grantTerms");
  await inTransaction(ctx.db, async (tx) => {
    const mine = and(eq(clients.laboratoryId, ctx.laboratoryId), eq(clients.id, clientId));
    const [before] = await tx.select({ terms: clients.terms, version: clients.version }).from(clients).where(mine).for("update");
    if (!before) throw new AppError("not_found", "There is no such client.");
    if (before.terms === terms) return;
    if (before.version !== version) throw new AppError("conflict", "Somebody has changed this client since you opened the page. Look at it again, then choose the terms.");
    const isAccount = terms === "account";
    await tx
      .update(clients)
      .set({ terms, termsGrantedBy: isAccount ? ctx.actorId : null, termsGrantedAt: isAccount ? ctx.now : null, version: sql`${clients.version} + 1` })
      .where(mine);
    await recordAudit({ ...ctx, db: tx }, { action: "client.termsChanged", subject: { kind: "client", id: clientId }, detail: { from: before.terms, to: terms } });
  });
}
