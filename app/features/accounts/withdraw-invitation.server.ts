import { and, eq, gt, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { emailTokens } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Makes a waiting invitation's link useless. `invitationId` is as `listTeam` names it. */
export async function withdrawInvitation(ctx: LabContext, { invitationId }: { invitationId: string }): Promise<void> {
  requireRole(ctx, "team.manage");
  if (!/^[0-9a-f]{64}$/.test(invitationId)) throw gone();
  await inTransaction(ctx.db, async (tx) => {
    const [result] = await tx
      .update(emailTokens)
      .set({ usedAt: ctx.now })
      .where(
        and(
          eq(emailTokens.tokenHash, Buffer.from(invitationId, "hex")),
          eq(emailTokens.laboratoryId, ctx.laboratoryId),
          eq(emailTokens.purpose, "inviteStaff"),
          isNull(emailTokens.usedAt),
          gt(emailTokens.expiresAt, ctx.now),
        ),
      );
    if (result.affectedRows !== 1) throw gone();
    await recordAudit({ ...ctx, db: tx }, { action: "member.invitationWithdrawn", subject: { kind: "laboratory", id: ctx.laboratoryId } });
  });
}

function gone(): AppError {
  return new AppError("not_found", "This invitation is not waiting any more.");
}
