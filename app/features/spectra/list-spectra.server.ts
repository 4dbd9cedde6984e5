import { and, asc, eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { spectra, stones, users } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { hasOwnOpenCheck } from "#app/features/second-checks/own-open-check.ts";

const withdrawers = alias(users, "withdrawers");

/** A stone's measured spectra as they are shown, withdrawn ones in their places; none to somebody whose check of it is open. */
export async function listSpectra(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "readings.read");
  const rows = await ctx.db
    .select({
      sequence: spectra.sequence,
      note: spectra.note,
      fileName: spectra.fileName,
      sizeBytes: spectra.sizeBytes,
      format: spectra.format,
      title: spectra.title,
      kind: spectra.kind,
      xUnit: spectra.xUnit,
      yUnit: spectra.yUnit,
      isUnitAssumed: spectra.isUnitAssumed,
      pointCount: spectra.pointCount,
      firstX: spectra.firstX,
      lastX: spectra.lastX,
      curve: spectra.curve,
      peaks: spectra.peaks,
      notes: spectra.notes,
      createdAt: spectra.createdAt,
      createdBy: users.name,
      isOwn: sql<number>`${spectra.createdBy} = ${sql.param(ctx.actorId, spectra.createdBy)}`,
      withdrawnAt: spectra.withdrawnAt,
      withdrawnBy: withdrawers.name,
      withdrawnReason: spectra.withdrawnReason,
    })
    .from(stones)
    .innerJoin(spectra, and(eq(spectra.laboratoryId, stones.laboratoryId), eq(spectra.stoneId, stones.id)))
    .innerJoin(users, eq(users.id, spectra.createdBy))
    .leftJoin(withdrawers, eq(withdrawers.id, spectra.withdrawnBy))
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode), sql`not ${hasOwnOpenCheck(ctx.actorId)}`))
    .orderBy(asc(spectra.sequence));
  return rows.map(({ isOwn, withdrawnAt, withdrawnBy, withdrawnReason, ...row }) => ({
    ...row,
    isOwn: Boolean(Number(isOwn)),
    withdrawal: withdrawnAt && { at: withdrawnAt, by: withdrawnBy ?? "", reason: withdrawnReason },
  }));
}
export type SpectrumItem = Awaited<ReturnType<typeof listSpectra>>[number];
