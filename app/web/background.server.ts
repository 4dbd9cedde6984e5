import { purgeExpired } from "#app/features/accounts/purge-expired.server.ts";
import { deliverDueMail } from "#app/features/mail/deliver-due-mail.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { unscopedIssueReadyReports } from "#app/features/reports/unscoped-issue-ready-reports.server.ts";
import { log } from "./log.server.ts";
import { getRuntime } from "./runtime.server.ts";

type Work = { name: string; everyMs: number; run: (app: ReturnType<typeof getRuntime> & { now: Date }) => Promise<unknown> };

const works: readonly Work[] = [
  { name: "reports", everyMs: 1_000, run: async (app) => ((await renderQueuedReports(app)), unscopedIssueReadyReports(app)) },
  { name: "mail", everyMs: 1_000, run: (app) => deliverDueMail(app) },
  { name: "purge", everyMs: 60_000, run: (app) => purgeExpired(app) },
];
/** A database that is away fails every second: said once a minute. */
const complainEveryMs = 60_000;

/**
 * Renders and issues reports, delivers mail and clears what ran out, in this process and in any other: rows are leased, so
 * two of them never do the same one. Each kind of work goes on while another fails. Switched off by ISOGYRE_JOBS=0.
 */
export function startBackgroundWork(): void {
  if (process.env.ISOGYRE_JOBS === "0" || process.env.NODE_ENV === "test") return;
  for (const work of works) {
    let isRunning = false;
    let complainedAt = 0;
    setInterval(async () => {
      if (isRunning) return;
      isRunning = true;
      try {
        await work.run({ ...getRuntime(), now: new Date() });
      } catch (error) {
        if (Date.now() - complainedAt > complainEveryMs) log.error({ err: error, work: work.name }, "background work failed");
        complainedAt = Date.now();
      } finally {
        isRunning = false;
      }
    }, work.everyMs).unref();
  }
}
