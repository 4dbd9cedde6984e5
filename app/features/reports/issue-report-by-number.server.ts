import { and, eq } from "drizzle-orm";
import { reports } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { issueReport } from "./issue-report.server.ts";

/** A member issues an authorised report by hand, where waiting for the automatic step is not wanted. */
export async function issueReportByNumber(ctx: LabContext, { number }: { number: string }): Promise<void> {
  requireRole(ctx, "reports.issue");
  const [report] = await ctx.db
    .select({ id: reports.id })
    .from(reports)
    .where(and(eq(reports.laboratoryId, ctx.laboratoryId), eq(reports.number, number)));
  if (!report) throw new AppError("not_found", "There is no such report.");
  await issueReport(ctx, { reportId: report.id });
}
