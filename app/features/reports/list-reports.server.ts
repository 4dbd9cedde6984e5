import { and, desc, eq, lt, or } from "drizzle-orm";
import { clients, reports, stones } from "#app/db/schema/index.ts";
import type { ReportId } from "#app/domain/ids.ts";
import type { ReportState } from "#app/domain/report-state.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

export type ReportCursor = { createdAt: Date; id: ReportId };

/** Newest first, 50 at a time; for the next page pass `nextCursor` as `after`. */
export async function listReports(ctx: LabContext, { state, after, limit = 50 }: { state?: ReportState; after?: ReportCursor; limit?: number }) {
  requireRole(ctx, "reports.read");
  const older = after && or(lt(reports.createdAt, after.createdAt), and(eq(reports.createdAt, after.createdAt), lt(reports.id, after.id)));
  const rows = await ctx.db
    .select({
      id: reports.id,
      number: reports.number,
      kind: reports.kind,
      version: reports.version,
      state: reports.state,
      pdfState: reports.pdfState,
      reportOn: reports.reportOn,
      issuedAt: reports.issuedAt,
      createdAt: reports.createdAt,
      stoneCode: stones.code,
      description: stones.description,
      clientName: clients.name,
    })
    .from(reports)
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .where(and(eq(reports.laboratoryId, ctx.laboratoryId), state && eq(reports.state, state), older))
    .orderBy(desc(reports.createdAt), desc(reports.id))
    .limit(limit + 1);
  const page = rows.slice(0, limit);
  const last = rows.length > limit ? page.at(-1) : undefined;
  return { reports: page.map(({ id: _id, createdAt: _at, ...row }) => row), nextCursor: last ? { createdAt: last.createdAt, id: last.id } : undefined };
}
