import { and, asc, eq } from "drizzle-orm";
import { referenceMaterials } from "#app/db/schema/index.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** The laboratory's references by name; a laboratory has dozens. Of one kind of instrument: those that can still be read. */
export async function listReferenceMaterials(ctx: LabContext, { forKind }: { forKind?: InstrumentKind } = {}) {
  requireRole(ctx, "instruments.read");
  const rows = await ctx.db
    .select()
    .from(referenceMaterials)
    .where(and(eq(referenceMaterials.laboratoryId, ctx.laboratoryId), ...(forKind ? [eq(referenceMaterials.forKind, forKind), eq(referenceMaterials.isRetired, false)] : [])))
    .orderBy(asc(referenceMaterials.name));
  return rows.map(({ laboratoryId: _, id, ...row }) => ({ ...row, ref: shortRef(id) }));
}

export type ReferenceMaterial = Awaited<ReturnType<typeof listReferenceMaterials>>[number];
