import { and, desc, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { registerPhotos, reports, stones, valuations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { nextInSeries } from "#app/features/laboratories/next-in-series.server.ts";
import { requireNoRecall } from "#app/features/recalls/require-no-recall.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";
import { buildReportView } from "./build-report-view.server.ts";
import { freezePhoto } from "./freeze-photo.server.ts";
import { newRegisterCode } from "./new-register-code.server.ts";

/**
 * The signatory's act: freezes what the report says, gives it its number and its code, and queues its PDF, all or
 * nothing. Needs a checked identity, no reading that is called back and, where the client ordered a valuation, a signed one.
 * @returns the report's number
 */
export async function authoriseReport(ctx: LabContext, { stoneCode }: { stoneCode: string }): Promise<string> {
  const { laboratoryId, laboratory } = ctx;
  const [stone] = await ctx.db
    .select({ id: stones.id, clientId: stones.clientId, state: stones.examinationState, isValuationOrdered: stones.isValuationOrdered })
    .from(stones)
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)));
  requireRole(ctx, "reports.read");
  if (!stone) throw new AppError("not_found", "There is no such stone.");
  requireRole(ctx, stone.isValuationOrdered ? "reports.authoriseValuation" : "reports.authoriseIdentification");
  if (stone.state !== "checked") throw new AppError("conflict", "Only a checked stone's report can be authorised. Open the stone to see how it stands.");
  if (stone.isValuationOrdered) {
    const [valuation] = await ctx.db
      .select({ state: valuations.state })
      .from(valuations)
      .where(and(eq(valuations.laboratoryId, laboratoryId), eq(valuations.stoneId, stone.id)))
      .orderBy(desc(valuations.version))
      .limit(1);
    if (valuation?.state !== "signed") throw new AppError("conflict", "The client ordered a valuation, and it is not signed yet.");
  }

  await requireNoRecall(ctx, { stoneId: stone.id });
  // Fetched before the transaction: a slow file store must not hold its locks.
  const photo = await freezePhoto(ctx, { stoneId: stone.id });
  const reportOn = calendarDateIn(ctx.now, laboratory.timeZone);
  const kind = stone.isValuationOrdered ? "identificationWithValuation" : "identification";
  return inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    // First the move: of two signatories at once the second fails here, before a number is taken.
    await moveExamination(scope, { stoneId: stone.id, from: "checked", to: "authorised", why: "report authorised" });
    const [previous] = await tx
      .select({ id: reports.id, version: reports.version, number: reports.number, state: reports.state })
      .from(reports)
      .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.stoneId, stone.id)))
      .orderBy(desc(reports.version))
      .limit(1);
    const id = newId<"report">();
    const version = (previous?.version ?? 0) + 1;
    const code = newRegisterCode();
    const sequence = await nextInSeries(scope, { series: "report", year: Number(reportOn.slice(0, 4)) });
    const number = `${laboratory.prefix}-R-${reportOn.slice(2, 4)}-${String(sequence).padStart(5, "0")}`;
    const snapshot = await buildReportView(scope, { stoneId: stone.id, kind, number, version, code, reportOn, supersedesNumber: previous?.state === "issued" ? previous.number : null });
    await tx.insert(reports).values({
      laboratoryId,
      id,
      number,
      kind,
      stoneId: stone.id,
      clientId: stone.clientId,
      state: "authorised",
      version,
      code,
      snapshot,
      reportOn,
      authorisedBy: ctx.actorId,
      authorisedAt: ctx.now,
      pdfState: "queued",
      supersedesId: previous?.state === "issued" ? previous.id : null,
      createdAt: ctx.now,
    });
    if (photo && snapshot.photograph) await tx.insert(registerPhotos).values({ laboratoryId, reportId: id, jpeg: photo });
    await recordAudit(scope, { action: "report.authorised", subject: { kind: "report", id }, detail: { number, version } });
    return number;
  });
}
