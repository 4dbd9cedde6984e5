import { and, eq, gt, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, emailTokens } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ClientId } from "#app/domain/ids.ts";
import { inviteClientEmail } from "#app/emails/invite-client-email.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { invitationDays, invitationMs } from "./email-token-lifetime.ts";
import { normalEmail } from "./normal-email.ts";
import { writeEmailToken } from "./write-email-token.server.ts";

/** Sends a client a link to pages of their own. A newer link replaces an older one; sent twice is sent once. @returns the address it went to */
export async function inviteClient(ctx: LabContext, { clientId, requestId }: { clientId: ClientId; requestId: string }): Promise<{ to: string }> {
  requireRole(ctx, "clients.manage");
  await consume(ctx, { door: "invitation", key: ctx.laboratoryId });
  return inTransaction(ctx.db, async (tx) => {
    const inTx = { ...ctx, db: tx };
    const [client] = await tx
      .select({ name: clients.name, contactName: clients.contactName, email: clients.email })
      .from(clients)
      .where(and(eq(clients.laboratoryId, ctx.laboratoryId), eq(clients.id, clientId)))
      .for("update");
    if (!client) throw new AppError("not_found", "There is no such client.");
    if (client.email === "") throw new AppError("conflict", "The client has no e-mail address yet. Add one first.");
    const to = normalEmail(client.email);
    const pending = and(eq(emailTokens.laboratoryId, ctx.laboratoryId), eq(emailTokens.purpose, "inviteClient"), isNull(emailTokens.usedAt), gt(emailTokens.expiresAt, ctx.now));
    const waiting = (await tx.select({ tokenHash: emailTokens.tokenHash, payload: emailTokens.payload }).from(emailTokens).where(pending)).filter(({ payload }) => payload.clientId === clientId);
    if (waiting.some(({ payload }) => payload.requestId === requestId)) return { to };
    for (const { tokenHash } of waiting) await tx.update(emailTokens).set({ usedAt: ctx.now }).where(eq(emailTokens.tokenHash, tokenHash));
    const name = client.contactName || client.name;
    const token = await writeEmailToken(inTx, { purpose: "inviteClient", email: to, laboratoryId: ctx.laboratoryId, createdBy: ctx.actorId, payload: { name, clientId, requestId }, validMs: invitationMs });
    await queueMail(inTx, {
      laboratoryId: ctx.laboratoryId,
      to: { address: to, name },
      kind: "inviteClient",
      dedupeKey: `inviteClient:${requestId}`,
      message: inviteClientEmail({ laboratoryName: ctx.laboratory.name, recipientName: name, url: `${ctx.services.publicOrigin}/invitation/${token}`, validDays: invitationDays }),
    });
    await recordAudit(inTx, { action: "client.invited", subject: { kind: "client", id: clientId } });
    return { to };
  });
}
