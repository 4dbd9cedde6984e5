import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { membershipRoles, memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { lockMember } from "./lock-member.server.ts";

/** Takes a person out of the team at once. What they recorded and signed stays theirs. The last owner cannot be taken out. */
export async function endMembership(ctx: LabContext, { userId }: { userId: UserId }): Promise<void> {
  requireRole(ctx, "team.manage");
  await inTransaction(ctx.db, async (tx) => {
    const member = await lockMember({ ...ctx, db: tx }, userId);
    if (member.roles.includes("owner") && !member.hasOtherOwner) throw new AppError("conflict", "This is the last owner. Make somebody else an owner first.");
    await tx.update(memberships).set({ endedAt: ctx.now }).where(and(eq(memberships.laboratoryId, ctx.laboratoryId), eq(memberships.userId, userId)));
    await tx.delete(membershipRoles).where(and(eq(membershipRoles.laboratoryId, ctx.laboratoryId), eq(membershipRoles.userId, userId)));
    await recordAudit({ ...ctx, db: tx }, { action: "member.ended", subject: { kind: "user", id: userId }, detail: { roles: member.roles } });
  });
}
