import { and, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { referenceMaterials } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ReferenceMaterialId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { ReferenceDetails } from "./reference-forms.server.ts";

/** @param input.requestId becomes the reference's id, so that a form sent twice adds one */
export async function addReferenceMaterial(ctx: LabContext, { requestId, ...details }: ReferenceDetails & { requestId: ReferenceMaterialId }): Promise<ReferenceMaterialId> {
  requireRole(ctx, "instruments.manage");
  try {
    await inTransaction(ctx.db, async (tx) => {
      await tx.insert(referenceMaterials).values({ ...details, laboratoryId: ctx.laboratoryId, id: requestId, createdAt: ctx.now });
      await recordAudit({ ...ctx, db: tx }, { action: "referenceMaterial.added", subject: { kind: "referenceMaterial", id: requestId }, detail: { name: details.name, nominalValue: details.nominalValue } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db.select({ id: referenceMaterials.id }).from(referenceMaterials).where(and(eq(referenceMaterials.laboratoryId, ctx.laboratoryId), eq(referenceMaterials.id, requestId)));
    if (!made) throw referenceNameTaken(details.name, error);
  }
  return requestId;
}

export function referenceNameTaken(name: string, cause: unknown): AppError {
  const message = `There is already a reference called ${name}. Say which piece or which of its values this one is.`;
  return new AppError("conflict", message, { cause, fieldErrors: { name: [message] } });
}
