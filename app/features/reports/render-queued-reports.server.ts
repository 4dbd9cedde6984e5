import { createHash } from "node:crypto";
import { and, asc, eq, isNull, lte, or, sql } from "drizzle-orm";
import type { Db } from "#app/db/client.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { reportFiles, reports } from "#app/db/schema/index.ts";
import type { LaboratoryId, ReportId } from "#app/domain/ids.ts";
import type { Services } from "#app/features/services.ts";
import { readReportPhoto } from "./read-report-photo.server.ts";
import { reportTemplateVersion, type ReportView } from "#app/reports/report-view.ts";

const leaseMs = 120_000;
/** After so many tries the report waits, with its reason, for a person to retry. */
const mostAttempts = 3;

type Job = { laboratoryId: LaboratoryId; id: ReportId; attempts: number };

/**
 * Renders reports that wait for their PDF, at most `limit`. A row is leased by conditional UPDATE, so that processes share
 * the queue; the bytes are inserted once and never written over.
 */
export async function renderQueuedReports(app: { db: Db; services: Services; now: Date }, { limit = 5 } = {}): Promise<number> {
  const isFree = or(isNull(reports.pdfLeaseUntil), lte(reports.pdfLeaseUntil, app.now));
  const queue = await app.db
    .select({ laboratoryId: reports.laboratoryId, id: reports.id, attempts: reports.pdfAttempts })
    .from(reports)
    .where(and(eq(reports.pdfState, "queued"), isFree))
    .orderBy(asc(reports.authorisedAt))
    .limit(limit);
  let rendered = 0;
  for (const job of queue) {
    // In a transaction for its retries: claims of several processes may deadlock on the queue's index.
    const [claim] = await inTransaction(app.db, (tx) =>
      tx
        .update(reports)
        .set({ pdfLeaseUntil: new Date(app.now.getTime() + leaseMs), pdfAttempts: job.attempts + 1 })
        .where(and(eq(reports.laboratoryId, job.laboratoryId), eq(reports.id, job.id), eq(reports.pdfState, "queued"), eq(reports.pdfAttempts, job.attempts), isFree)),
    );
    if (claim.affectedRows === 1 && (await renderOne(app, job))) rendered++;
  }
  return rendered;
}

async function renderOne(app: { db: Db; services: Services; now: Date }, { laboratoryId, id, attempts }: Job): Promise<boolean> {
  const isThis = and(eq(reports.laboratoryId, laboratoryId), eq(reports.id, id));
  try {
    const [row] = await app.db.select({ snapshot: reports.snapshot, stoneId: reports.stoneId }).from(reports).where(isThis);
    if (!row?.snapshot) throw new Error("the report has no frozen content");
    const jpeg = await readReportPhoto(app, { laboratoryId, reportId: id });
    const view = row.snapshot as ReportView;
    const pdf = Buffer.from(await app.services.reportRenderer.render({ ...view, photograph: jpeg && view.photograph ? { ...view.photograph, jpeg: new Uint8Array(jpeg) } : null }));
    const sha256 = createHash("sha256").update(pdf).digest();
    await inTransaction(app.db, async (tx) => {
      // A second worker whose lease ran out finds the bytes there and leaves them.
      await tx
        .insert(reportFiles)
        .values({ laboratoryId, reportId: id, pdf, sha256, sizeBytes: pdf.byteLength, templateVersion: reportTemplateVersion, renderedAt: app.now })
        .onDuplicateKeyUpdate({ set: { reportId: sql`${reportFiles.reportId}` } });
      await tx.update(reports).set({ pdfState: "ready", pdfFailure: "", pdfLeaseUntil: null }).where(and(isThis, eq(reports.pdfState, "queued")));
    });
    return true;
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    await app.db
      .update(reports)
      .set({
        pdfState: attempts + 1 >= mostAttempts ? "failed" : "queued",
        pdfFailure: reason.slice(0, 500),
        pdfLeaseUntil: new Date(app.now.getTime() + 5_000 * 2 ** attempts),
      })
      .where(and(isThis, eq(reports.pdfState, "queued")));
    return false;
  }
}
