import { and, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { membershipRoles, memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { Role } from "#app/domain/roles.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { lockMember } from "./lock-member.server.ts";

type RoleChange = { userId: UserId; roles: readonly Role[]; title: string; /** As the page showed them. */ rolesBefore: readonly Role[]; titleBefore: string };

/** Gives a member exactly these roles. The last owner stays one. */
export async function setMemberRoles(ctx: LabContext, { userId, roles, title, rolesBefore, titleBefore }: RoleChange): Promise<void> {
  requireRole(ctx, "team.manage");
  if (roles.length === 0) {
    const message = "Choose at least one role, or end the membership.";
    throw new AppError("invalid_input", message, { fieldErrors: { roles: [message] } });
  }
  await inTransaction(ctx.db, async (tx) => {
    const member = await lockMember({ ...ctx, db: tx }, userId);
    if ([...rolesBefore].sort().join() !== [...member.roles].sort().join() || titleBefore !== member.title) {
      throw new AppError("conflict", "Somebody has changed this person's roles since you opened the page. Open it anew, and look first.");
    }
    if (member.roles.includes("owner") && !roles.includes("owner") && !member.hasOtherOwner) {
      const message = "This is the last owner. Make somebody else an owner first.";
      throw new AppError("conflict", message, { fieldErrors: { roles: [message] } });
    }
    const theirs = and(eq(membershipRoles.laboratoryId, ctx.laboratoryId), eq(membershipRoles.userId, userId));
    await tx.delete(membershipRoles).where(theirs);
    await tx.insert(membershipRoles).values([...new Set(roles)].map((role) => ({ laboratoryId: ctx.laboratoryId, userId, role })));
    await tx.update(memberships).set({ title }).where(and(eq(memberships.laboratoryId, ctx.laboratoryId), eq(memberships.userId, userId)));
    await recordAudit({ ...ctx, db: tx }, { action: "member.rolesSet", subject: { kind: "user", id: userId }, detail: { from: member.roles, to: roles } });
  });
}
