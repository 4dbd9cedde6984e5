import { and, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clients, invoices, itemConsents, registerEntries, registerPhotos, reportFiles, reports, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ReportId } from "#app/domain/ids.ts";
import { reportIssuedEmail } from "#app/emails/report-issued-email.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";
import type { ReportView } from "#app/reports/report-view.ts";
import { registerViewOf } from "./register-view-of.ts";

/**
 * authorised → issued, exactly once, with the entry in the public register and the mail to the client. Refused while the
 * PDF is not there, and while it is unpaid unless the client has account terms. A report that it replaces becomes
 * superseded in the same transaction.
 */
export async function issueReport(scope: LabScope, { reportId }: { reportId: ReportId }): Promise<void> {
  const { laboratoryId } = scope;
  const [found] = await scope.db
    .select({
      report: reports,
      stone: { id: stones.id, itemId: stones.itemId, takeInId: stones.takeInId, code: stones.code },
      client: { name: clients.name, email: clients.email, terms: clients.terms },
      sha256: reportFiles.sha256,
      invoiceState: sql<string | null>`(select ${invoices.state} from ${invoices} where ${invoices.laboratoryId} = ${reports.laboratoryId}
        and ${invoices.takeInId} = ${stones.takeInId} and ${invoices.state} <> 'void' order by ${invoices.id} desc limit 1)`,
      hasPhoto: sql<number>`exists (select 1 from ${registerPhotos} where ${registerPhotos.laboratoryId} = ${reports.laboratoryId} and ${registerPhotos.reportId} = ${reports.id})`,
      isPublic: sql<number | null>`(select ${itemConsents.isGiven} from ${itemConsents} where ${itemConsents.laboratoryId} = ${reports.laboratoryId}
        and ${itemConsents.itemId} = ${stones.itemId} and ${itemConsents.code} = 'publicRegister')`,
    })
    .from(reports)
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .leftJoin(reportFiles, and(eq(reportFiles.laboratoryId, reports.laboratoryId), eq(reportFiles.reportId, reports.id)))
    .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.id, reportId)));
  if (!found) throw new AppError("not_found", "There is no such report.");
  const { report, stone, client } = found;
  if (report.state !== "authorised") throw new AppError("conflict", "This report is not waiting to be issued.");
  if (report.pdfState === "failed") throw new AppError("conflict", `The PDF could not be made: ${report.pdfFailure} Retry it first.`);
  if (report.pdfState !== "ready" || !found.sha256) throw new AppError("conflict", "The PDF of this report is still being made. Try again in a moment.");
  if (client.terms !== "account" && found.invoiceState !== "paid") {
    throw new AppError("conflict", found.invoiceState === "refunded" ? "The fee for this report was given back, so it cannot be issued." : "The fee for this report is not paid yet.");
  }

  const sha256 = found.sha256;
  const view = report.snapshot as ReportView;
  const number = report.number!;
  await inTransaction(scope.db, async (tx) => {
    const inTx = { ...scope, db: tx };
    const [result] = await tx
      .update(reports)
      .set({ state: "issued", issuedAt: scope.now })
      .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.id, reportId), eq(reports.state, "authorised"), eq(reports.pdfState, "ready")));
    if (result.affectedRows !== 1) throw new AppError("conflict", "This report is not waiting to be issued.");
    await moveExamination(inTx, { stoneId: stone.id, from: "authorised", to: "issued", why: `report ${number} issued` });
    await tx.insert(registerEntries).values({
      code: report.code!,
      laboratoryId,
      reportId,
      state: "issued",
      view: registerViewOf(view, { isPublic: Boolean(found.isPublic), reportOn: report.reportOn!, hasPhoto: Boolean(found.hasPhoto) }),
      pdfSha256: sha256,
      issuedAt: scope.now,
    });
    if (report.supersedesId) {
      await tx
        .update(reports)
        .set({ state: "superseded" })
        .where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.id, report.supersedesId), eq(reports.state, "issued")));
      await tx
        .update(registerEntries)
        .set({ state: "superseded", supersededByNumber: number, supersededByCode: report.code, version: sql`${registerEntries.version} + 1` })
        .where(and(eq(registerEntries.laboratoryId, laboratoryId), eq(registerEntries.reportId, report.supersedesId), eq(registerEntries.state, "issued")));
    }
    await recordAudit(inTx, { action: "report.issued", subject: { kind: "report", id: reportId }, detail: { number, sha256: sha256.toString("hex") } });
    if (client.email) {
      await queueMail(inTx, {
        laboratoryId,
        to: { address: client.email, name: client.name },
        kind: "reportIssued",
        dedupeKey: `report-issued:${reportId}`,
        message: reportIssuedEmail({
          laboratoryName: view.laboratory.name,
          recipientName: client.name,
          reportNumber: number,
          url: `${scope.services.publicOrigin}/my`,
          verificationUrl: view.verification.url,
        }),
      });
    }
  });
}
