import { and, eq, inArray, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, registerEntries, reports } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { withdrawalReasonNames, type WithdrawalReason } from "#app/domain/report-state.ts";
import { reportWithdrawnEmail } from "#app/emails/report-withdrawn-email.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { requireRole } from "#app/features/require-role.ts";

/** An issued or superseded report is withdrawn for good; the register shows when and which class of reason. The file stays. */
export async function withdrawReport(ctx: LabContext, { number, reason, note }: { number: string; reason: WithdrawalReason; note: string }): Promise<void> {
  requireRole(ctx, "reports.withdraw");
  const { laboratoryId } = ctx;
  const [report] = await ctx.db
    .select({ id: reports.id, state: reports.state, clientName: clients.name, clientEmail: clients.email })
    .from(reports)
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.number, number)));
  if (!report) throw new AppError("not_found", "There is no such report.");
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const [result] = await tx
      .update(reports)
      .set({ state: "withdrawn", withdrawnAt: ctx.now, withdrawnBy: ctx.actorId, withdrawalReason: reason, withdrawalNote: note })
      .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.id, report.id), inArray(reports.state, ["issued", "superseded"])));
    if (result.affectedRows !== 1) throw new AppError("conflict", `Report ${number} is ${report.state}; only an issued report can be withdrawn.`);
    await tx
      .update(registerEntries)
      .set({ state: "withdrawn", withdrawnAt: ctx.now, withdrawalReason: reason, version: sql`${registerEntries.version} + 1` })
      .where(and(eq(registerEntries.laboratoryId, laboratoryId), eq(registerEntries.reportId, report.id)));
    await recordAudit(scope, { action: "report.withdrawn", subject: { kind: "report", id: report.id }, detail: { reason }, reason: note });
    if (report.clientEmail) {
      await queueMail(scope, {
        laboratoryId,
        to: { address: report.clientEmail, name: report.clientName },
        kind: "reportWithdrawn",
        dedupeKey: `report-withdrawn:${report.id}`,
        message: reportWithdrawnEmail({
          laboratoryName: ctx.laboratory.name,
          recipientName: report.clientName,
          reportNumber: number,
          reasonClass: withdrawalReasonNames[reason],
          url: `${ctx.services.publicOrigin}/my`,
        }),
      });
    }
  });
}
