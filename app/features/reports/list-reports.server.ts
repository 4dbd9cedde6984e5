import { and, desc, eq, lt, or, sql } from "drizzle-orm";
import { clients, reports, stones } from "#app/db/schema/index.ts";
import type { ReportId } from "#app/domain/ids.ts";
import type { ReportState } from "#app/domain/report-state.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { callsBack, isOpen } from "#app/features/recalls/called-back.server.ts";
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
      /** A reading in it was called back, and nobody has answered for it. */
      isRecalled: sql<number>`exists (select 1 from observations o join instrument_checks k on ${callsBack} where o.laboratory_id = ${reports.laboratoryId} and o.stone_id = ${reports.stoneId} and ${isOpen} and o.recorded_at <= ${reports.authorisedAt}
        and not exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id and s.struck_at <= ${reports.authorisedAt}))`,
    })
    .from(reports)
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .where(and(eq(reports.laboratoryId, ctx.laboratoryId), state && eq(reports.state, state), older))
    .orderBy(desc(reports.createdAt), desc(reports.id))
    .limit(limit + 1);
  const page = rows.slice(0, limit);
  const last = rows.length > limit ? page.at(-1) : undefined;
  return { reports: page.map(({ id: _id, createdAt: _at, ...row }) => ({ ...row, isRecalled: row.state !== "withdrawn" && Boolean(Number(row.isRecalled)) })), nextCursor: last ? { createdAt: last.createdAt, id: last.id } : undefined };
}
