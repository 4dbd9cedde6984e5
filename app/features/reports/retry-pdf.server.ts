import { and, eq } from "drizzle-orm";
import { reports } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** failed → queued: the PDF is tried again from the same frozen content. */
export async function retryPdf(ctx: LabContext, { number }: { number: string }): Promise<void> {
  requireRole(ctx, "reports.issue");
  const isThis = and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number));
  const [report] = await ctx.db.select({ id: reports.id }).from(reports).where(isThis);
  if (!report) throw new AppError("not_found", "There is no such report.");
  const [result] = await ctx.db.update(reports).set({ pdfState: "queued", pdfAttempts: 0, pdfLeaseUntil: null }).where(and(isThis, eq(reports.pdfState, "failed")));
  if (result.affectedRows !== 1) throw new AppError("conflict", "The PDF of this report has not failed.");
  await recordAudit(ctx, { action: "report.pdfRetried", subject: { kind: "report", id: report.id } });
}
