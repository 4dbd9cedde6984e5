import { and, asc, eq, inArray, or } from "drizzle-orm";
import type { Db } from "#app/db/client.server.ts";
import { clients, invoices, reports, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { Services } from "#app/features/services.ts";
import { issueReport } from "./issue-report.server.ts";

/** Issues what waits for nothing any more: authorised, its PDF there, paid or on account. Spans laboratories; each is issued within its own. */
export async function unscopedIssueReadyReports(app: { db: Db; services: Services; now: Date }, { limit = 20 } = {}): Promise<number> {
  const ready = await app.db
    .selectDistinct({ laboratoryId: reports.laboratoryId, id: reports.id, authorisedAt: reports.authorisedAt })
    .from(reports)
    .innerJoin(stones, and(eq(stones.laboratoryId, reports.laboratoryId), eq(stones.id, reports.stoneId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, reports.laboratoryId), eq(clients.id, reports.clientId)))
    .leftJoin(invoices, and(eq(invoices.laboratoryId, stones.laboratoryId), eq(invoices.takeInId, stones.takeInId), inArray(invoices.state, ["paid"])))
    .where(and(eq(reports.pdfState, "ready"), eq(reports.state, "authorised"), or(eq(clients.terms, "account"), eq(invoices.state, "paid"))))
    .orderBy(asc(reports.authorisedAt))
    .limit(limit);
  let issued = 0;
  for (const { laboratoryId, id } of ready) {
    try {
      await issueReport({ db: app.db, laboratoryId, actorId: null, now: app.now, services: app.services }, { reportId: id });
      issued++;
    } catch (error) {
      // Somebody was quicker, or it was refunded meanwhile: nothing to do here.
      if (!(error instanceof AppError)) throw error;
    }
  }
  return issued;
}
