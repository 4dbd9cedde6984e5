import { and, desc, eq } from "drizzle-orm";
import { invoices, reports, stones, valuations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { registerCodeFrom } from "#app/domain/register-code.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { ReportView } from "#app/reports/report-view.ts";
import { buildReportView } from "./build-report-view.server.ts";

/** No report has this code: a draft's QR leads to a page that says so. */
const draftCode = registerCodeFrom(new Array<number>(15).fill(0));

/** What the report would say if it were authorised now, and what still stands in the way. */
export async function previewReport(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "conclusions.read");
  const { db, laboratoryId, laboratory } = ctx;
  const [stone] = await db
    .select({
      id: stones.id,
      code: stones.code,
      description: stones.description,
      state: stones.examinationState,
      isValuationOrdered: stones.isValuationOrdered,
      valuationState: valuations.state,
      invoiceState: invoices.state,
      reportNumber: reports.number,
    })
    .from(stones)
    .leftJoin(valuations, and(eq(valuations.laboratoryId, stones.laboratoryId), eq(valuations.stoneId, stones.id)))
    .leftJoin(invoices, and(eq(invoices.laboratoryId, stones.laboratoryId), eq(invoices.takeInId, stones.takeInId)))
    .leftJoin(reports, and(eq(reports.laboratoryId, stones.laboratoryId), eq(reports.stoneId, stones.id)))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
    .orderBy(desc(valuations.version), desc(invoices.createdAt), desc(reports.version))
    .limit(1);
  if (!stone) throw new AppError("not_found", "There is no such stone.");
  const isChecked = stone.state === "checked";
  const view: ReportView | null = isChecked
    ? await buildReportView(ctx, {
        stoneId: stone.id,
        kind: stone.isValuationOrdered ? "identificationWithValuation" : "identification",
        number: "Draft",
        version: 0,
        code: draftCode,
        reportOn: calendarDateIn(ctx.now, laboratory.timeZone),
        supersedesNumber: null,
        isDraft: true,
      })
    : null;
  return { stone, view };
}
