import { and, eq, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { referenceMaterials } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ReferenceMaterialId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { referenceNameTaken } from "./add-reference-material.server.ts";
import type { ReferenceEdit } from "./reference-forms.server.ts";

/** Changes what is known of a reference, unless somebody changed it since. Checks made with it keep the value that they were judged by. */
export async function editReferenceMaterial(ctx: LabContext, referenceId: ReferenceMaterialId, { version, ...fields }: ReferenceEdit): Promise<void> {
  requireRole(ctx, "instruments.manage");
  try {
    await inTransaction(ctx.db, async (tx) => {
      const mine = and(eq(referenceMaterials.laboratoryId, ctx.laboratoryId), eq(referenceMaterials.id, referenceId));
      const [before] = await tx.select({ version: referenceMaterials.version, nominalValue: referenceMaterials.nominalValue }).from(referenceMaterials).where(mine).for("update");
      if (!before) throw new AppError("not_found", "There is no such reference.");
      if (before.version !== version) throw new AppError("conflict", "Somebody has changed this reference since you opened the page. What you typed is still here: compare, then save again.");
      await tx.update(referenceMaterials).set({ ...fields, version: sql`${referenceMaterials.version} + 1` }).where(mine);
      await recordAudit({ ...ctx, db: tx }, { action: "referenceMaterial.changed", subject: { kind: "referenceMaterial", id: referenceId }, detail: { from: before.nominalValue, to: fields.nominalValue, isRetired: fields.isRetired } });
    });
  } catch (error) {
    if (constraintKind(error) === "duplicate") throw referenceNameTaken(fields.name, error);
    throw error;
  }
}
