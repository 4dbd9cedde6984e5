import { and, eq, isNull, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { laboratories, memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { LaboratorySettings } from "./laboratory-forms.server.ts";

/** Changes the laboratory's settings, unless somebody changed them since this version was read. Reports that were authorised keep the old letterhead. */
export async function updateLaboratory(ctx: LabContext, { version, ...settings }: LaboratorySettings): Promise<void> {
  requireRole(ctx, "laboratory.manage");
  await inTransaction(ctx.db, async (tx) => {
    const [before] = await tx.select().from(laboratories).where(eq(laboratories.id, ctx.laboratoryId)).for("update");
    if (!before) throw new AppError("not_found", "There is no such laboratory.");
    if (before.version !== version) {
      throw new AppError("conflict", "Somebody has changed these settings since you opened the page. What you typed is still here: open the page anew beside it, compare, and save there.");
    }
    if (settings.isSolePractice && !before.isSolePractice) {
      const team = await tx.select({ userId: memberships.userId }).from(memberships).where(and(eq(memberships.laboratoryId, ctx.laboratoryId), isNull(memberships.endedAt))).limit(2);
      const message = "More than one person is in the team, so this is no sole practice.";
      if (team.length > 1) throw new AppError("invalid_input", message, { fieldErrors: { practice: [message] } });
    }
    await tx.update(laboratories).set({ ...settings, version: sql`${laboratories.version} + 1` }).where(eq(laboratories.id, ctx.laboratoryId));
    const changed = (Object.keys(settings) as Array<keyof typeof settings>).filter((key) => JSON.stringify(settings[key]) !== JSON.stringify(before[key]));
    await recordAudit({ ...ctx, db: tx }, { action: "laboratory.changed", subject: { kind: "laboratory", id: ctx.laboratoryId }, detail: { changed } });
  });
}
