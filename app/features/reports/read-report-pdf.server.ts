import { and, eq } from "drizzle-orm";
import { reportFiles, reports } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** The stored bytes: what was rendered once is what everybody gets. */
export async function readReportPdf(ctx: LabContext, { number }: { number: string }): Promise<{ pdf: Buffer; fileName: string }> {
  requireRole(ctx, "reports.read");
  const [row] = await ctx.db
    .select({ id: reports.id, pdf: reportFiles.pdf })
    .from(reports)
    .innerJoin(reportFiles, and(eq(reportFiles.laboratoryId, reports.laboratoryId), eq(reportFiles.reportId, reports.id)))
    .where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number)));
  if (!row) throw new AppError("not_found", "There is no PDF of such a report.");
  await recordAudit(ctx, { action: "report.read", subject: { kind: "report", id: row.id } });
  return { pdf: row.pdf, fileName: `${number}.pdf` };
}
