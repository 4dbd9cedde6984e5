import { and, eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { clients, reportFiles, reports, stones, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatRegisterCode } from "#app/domain/register-code.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { callsBack, isOpen } from "#app/features/recalls/called-back.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { parseJsonRows } from "#app/features/stones/parse-json-rows.ts";

/** One report as its page shows it; its bytes come by `readReportPdf`. */
export async function getReport(ctx: LabContext, { number }: { number: string }) {
  requireRole(ctx, "reports.read");
  const older = alias(reports, "older");
  const newer = alias(reports, "newer");
  const [row] = await ctx.db
    .select({
      id: reports.id,
      number: reports.number,
      kind: reports.kind,
      version: reports.version,
      state: reports.state,
      code: reports.code,
      reportOn: reports.reportOn,
      authorisedAt: reports.authorisedAt,
      authorisedByName: users.name,
      pdfState: reports.pdfState,
      pdfFailure: reports.pdfFailure,
      issuedAt: reports.issuedAt,
      withdrawnAt: reports.withdrawnAt,
      withdrawalReason: reports.withdrawalReason,
      withdrawalNote: reports.withdrawalNote,
      stoneCode: stones.code,
      description: stones.description,
      stoneState: stones.examinationState,
      clientName: clients.name,
      clientTerms: clients.terms,
      sizeBytes: reportFiles.sizeBytes,
      sha256: reportFiles.sha256,
      recalled: sql<string | null>`(select json_arrayagg(json_object('sequence', o.sequence, 'instrument', i.name, 'failedOn', k.reference_material) order by o.sequence) from observations o join instrument_checks k on ${callsBack}
        join instruments i on i.laboratory_id = k.laboratory_id and i.id = k.instrument_id where o.laboratory_id = ${reports.laboratoryId} and o.stone_id = ${reports.stoneId} and ${isOpen} and o.recorded_at <= ${reports.authorisedAt}
        and not exists (select 1 from observation_strikes s where s.laboratory_id = o.laboratory_id and s.observation_id = o.id and s.struck_at <= ${reports.authorisedAt}))`,
      supersedesNumber: older.number,
      supersededByNumber: newer.number,
    })
    .from(reports)
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .leftJoin(users, eq(users.id, reports.authorisedBy))
    .leftJoin(reportFiles, and(eq(reportFiles.laboratoryId, reports.laboratoryId), eq(reportFiles.reportId, reports.id)))
    .leftJoin(older, and(eq(older.laboratoryId, reports.laboratoryId), eq(older.id, reports.supersedesId)))
    .leftJoin(newer, and(eq(newer.laboratoryId, reports.laboratoryId), eq(newer.supersedesId, reports.id)))
    .where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number)));
  if (!row) throw new AppError("not_found", "There is no such report.");
  const { sha256, code, recalled, ...report } = row;
  return {
    ...report,
    /** Readings in it whose instrument failed a check since, and for which nobody has answered. */
    recalled: parseJsonRows<{ sequence: number; instrument: string; failedOn: string }>(recalled),
    shownCode: code ? formatRegisterCode(code) : "",
    verificationUrl: code ? `${ctx.services.publicOrigin}/v/${code}` : "",
    sha256: sha256?.toString("hex") ?? null,
  };
}
