import { and, eq, inArray } from "drizzle-orm";
import { clientUsers, reportFiles, reports } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { RegisterCode } from "#app/domain/register-code.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";

/** A client's own issued report: the stored bytes. Numbers repeat between laboratories, so it is asked for by its code. */
export async function readMyReportPdf(app: AppContext, { userId, code }: { userId: UserId; code: RegisterCode }): Promise<{ pdf: Buffer; fileName: string }> {
  const [row] = await app.db
    .select({ laboratoryId: reports.laboratoryId, id: reports.id, number: reports.number, pdf: reportFiles.pdf })
    .from(clientUsers)
    .innerJoin(reports, and(eq(reports.laboratoryId, clientUsers.laboratoryId), eq(reports.clientId, clientUsers.clientId)))
    .innerJoin(reportFiles, and(eq(reportFiles.laboratoryId, reports.laboratoryId), eq(reportFiles.reportId, reports.id)))
    .where(and(eq(clientUsers.userId, userId), eq(reports.code, code), inArray(reports.state, ["issued", "superseded", "withdrawn"])));
  if (!row) throw new AppError("not_found", "There is no such report among yours.");
  const scope = { db: app.db, laboratoryId: row.laboratoryId, actorId: userId, now: app.now, services: app.services };
  await recordAudit(scope, { action: "report.readByClient", subject: { kind: "report", id: row.id } });
  return { pdf: row.pdf, fileName: `${row.number}.pdf` };
}
