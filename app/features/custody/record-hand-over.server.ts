import { and, eq, isNull } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { HandOver } from "./custody-forms.server.ts";
import { moveGoods } from "./move-goods.server.ts";

/** An item goes from one place to another: safe, bench, an outside laboratory and back. Never edited afterwards. */
export async function recordHandOver(ctx: LabContext, { holder, ...input }: HandOver): Promise<void> {
  requireRole(ctx, "custody.record");
  await inTransaction(ctx.db, async (tx) => {
    const holderId = input.purpose === "toBench" ? (holder ?? ctx.actorId) : null;
    if (holderId) {
      const [member] = await tx
        .select({ userId: memberships.userId })
        .from(memberships)
        .where(and(eq(memberships.laboratoryId, ctx.laboratoryId), eq(memberships.userId, holderId), isNull(memberships.endedAt)));
      if (!member) throw new AppError("invalid_input", "Choose somebody of this laboratory.", { fieldErrors: { holder: ["Choose somebody of this laboratory."] } });
    }
    await moveGoods({ ...ctx, db: tx }, { ...input, holderId });
  });
}
