import { and, eq, gt, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { emailTokens, laboratories, memberships, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { roleNames, type Role } from "#app/domain/roles.ts";
import { inviteStaffEmail } from "#app/emails/invite-staff-email.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { invitationDays, invitationMs } from "./email-token-lifetime.ts";
import { normalEmail } from "./normal-email.ts";
import { writeEmailToken } from "./write-email-token.server.ts";

export type StaffInvitation = { name: string; email: string; title: string; roles: readonly Role[]; requestId: string };

/** Sends somebody a link to join with these roles. A newer invitation to the same address replaces an older one; sent twice is sent once. */
export async function inviteStaff(ctx: LabContext, { name, email, title, roles, requestId }: StaffInvitation): Promise<void> {
  requireRole(ctx, "team.manage");
  await consume(ctx, { door: "invitation", key: ctx.laboratoryId });
  const address = normalEmail(email);
  await inTransaction(ctx.db, async (tx) => {
    const inTx = { ...ctx, db: tx };
    // Two invitations at once wait for each other here.
    await tx.select({ id: laboratories.id }).from(laboratories).where(eq(laboratories.id, ctx.laboratoryId)).for("update");
    const [member] = await tx
      .select({ id: users.id })
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(and(eq(memberships.laboratoryId, ctx.laboratoryId), isNull(memberships.endedAt), eq(users.email, address)));
    if (member) {
      const message = "This person is in the team already. Change their roles in the list.";
      throw new AppError("conflict", message, { fieldErrors: { email: [message] } });
    }
    const pending = and(eq(emailTokens.laboratoryId, ctx.laboratoryId), eq(emailTokens.purpose, "inviteStaff"), eq(emailTokens.email, address), isNull(emailTokens.usedAt), gt(emailTokens.expiresAt, ctx.now));
    const waiting = await tx.select({ payload: emailTokens.payload }).from(emailTokens).where(pending);
    if (waiting.some(({ payload }) => payload.requestId === requestId)) return;
    await tx.update(emailTokens).set({ usedAt: ctx.now }).where(pending);
    const token = await writeEmailToken(inTx, { purpose: "inviteStaff", email: address, laboratoryId: ctx.laboratoryId, createdBy: ctx.actorId, payload: { name, title, roles: [...roles], requestId }, validMs: invitationMs });
    await queueMail(inTx, {
      laboratoryId: ctx.laboratoryId,
      to: { address, name },
      kind: "inviteStaff",
      dedupeKey: `inviteStaff:${requestId}`,
      message: inviteStaffEmail({
        laboratoryName: ctx.laboratory.name,
        invitedByName: ctx.person.name,
        recipientName: name,
        roleNames: roles.map((role) => roleNames[role]),
        url: `${ctx.services.publicOrigin}/invitation/${token}`,
        validDays: invitationDays,
      }),
    });
    await recordAudit(inTx, { action: "member.invited", subject: { kind: "laboratory", id: ctx.laboratoryId }, detail: { roles } });
  });
}
