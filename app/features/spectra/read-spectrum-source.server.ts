import { createHash } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import { spectra, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { hasOwnOpenCheck } from "#app/features/second-checks/own-open-check.ts";

/** The file of a measured spectrum as it came, or an error. */
export async function readSpectrumSource(ctx: LabContext, { stoneCode, sequence }: { stoneCode: string; sequence: number }): Promise<{ bytes: Buffer; fileName: string }> {
  requireRole(ctx, "readings.read");
  const [row] = await ctx.db
    .select({ fileKey: spectra.fileKey, fileName: spectra.fileName, sha256: spectra.sha256 })
    .from(stones)
    .innerJoin(spectra, and(eq(spectra.laboratoryId, stones.laboratoryId), eq(spectra.stoneId, stones.id)))
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode), eq(spectra.sequence, sequence), sql`not ${hasOwnOpenCheck(ctx.actorId)}`));
  if (!row) throw new AppError("not_found", "There is no such spectrum.");
  const bytes = await ctx.services.uploads.get(row.fileKey).catch((error: unknown) => {
    throw new AppError("unavailable", "The file cannot be fetched just now. Try again in a minute.", { cause: error });
  });
  if (!createHash("sha256").update(bytes).digest().equals(row.sha256)) throw new Error(`spectrum ${sequence} of ${stoneCode} is not what was put away`);
  return { bytes, fileName: row.fileName };
}
