import { getRuntime } from "./runtime.server.ts";
import { log } from "./log.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { unscopedIssueReadyReports } from "#app/features/reports/unscoped-issue-ready-reports.server.ts";
import { deliverDueMail } from "#app/features/mail/deliver-due-mail.server.ts";

const intervalMs = 1_000;

/**
 * Delivers mail and renders reports that wait, once a second, in this process and in any other: rows are leased, so
 * two of them never do the same one. Switched off by ISOGYRE_JOBS=0.
 */
export function startBackgroundWork(): void {
  if (process.env.ISOGYRE_JOBS === "0" || process.env.NODE_ENV === "test") return;
  let isRunning = false;
  setInterval(async () => {
    if (isRunning) return;
    isRunning = true;
    try {
      const { db, services } = getRuntime();
      await renderQueuedReports({ db, services, now: new Date() });
      await unscopedIssueReadyReports({ db, services, now: new Date() });
      await deliverDueMail({ db, services, now: new Date() });
    } catch (error) {
      log.error({ err: error }, "background work failed");
    } finally {
      isRunning = false;
    }
  }, intervalMs).unref();
}
