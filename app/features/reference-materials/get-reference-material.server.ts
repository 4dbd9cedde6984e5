import { and, eq } from "drizzle-orm";
import { referenceMaterials } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ReferenceMaterialId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

export async function getReferenceMaterial(ctx: LabContext, referenceId: ReferenceMaterialId) {
  requireRole(ctx, "instruments.read");
  const [row] = await ctx.db
    .select()
    .from(referenceMaterials)
    .where(and(eq(referenceMaterials.laboratoryId, ctx.laboratoryId), eq(referenceMaterials.id, referenceId)));
  if (!row) throw new AppError("not_found", "There is no such reference.");
  const { laboratoryId: _, id: __, ...reference } = row;
  return reference;
}
