import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { invoices } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** open → void, with a reason. A page of the payment service that is still open for it is closed first. */
export async function voidInvoice(ctx: LabContext, { number, reason }: { number: string; reason: string }): Promise<void> {
  requireRole(ctx, "invoices.manage");
  const isThis = and(eq(invoices.laboratoryId, ctx.laboratoryId), eq(invoices.number, number));
  const [invoice] = await ctx.db.select({ id: invoices.id, state: invoices.state, sessionId: invoices.checkoutSessionId }).from(invoices).where(isThis);
  if (!invoice) throw new AppError("not_found", "There is no such invoice.");
  if (invoice.state !== "open") throw new AppError("conflict", `Invoice ${number} is ${invoice.state} and cannot be voided.`);
  if (invoice.sessionId) {
    try {
      await ctx.services.stripe.checkout.sessions.expire(invoice.sessionId);
    } catch (error) {
      const session = await ctx.services.stripe.checkout.sessions.retrieve(invoice.sessionId).catch(() => undefined);
      if (session?.status !== "expired") {
        throw new AppError("conflict", `The payment page of invoice ${number} could not be closed: it may be being paid. Look again in a minute.`, { cause: error });
      }
    }
  }
  await inTransaction(ctx.db, async (tx) => {
    const [result] = await tx.update(invoices).set({ state: "void", voidedAt: ctx.now, voidReason: reason }).where(and(isThis, eq(invoices.state, "open")));
    if (result.affectedRows !== 1) throw new AppError("conflict", `Invoice ${number} changed meanwhile. Open it again to see how it stands.`);
    await recordAudit({ ...ctx, db: tx }, { action: "invoice.voided", subject: { kind: "invoice", id: invoice.id }, reason });
  });
}
