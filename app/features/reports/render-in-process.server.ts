import { renderReport } from "#app/reports/render-report.ts";
import type { ReportView } from "#app/reports/report-view.ts";

/** A report's PDF on this very thread: for scripts and the development server, where no worker is built. */
export function renderInProcess(view: unknown): Promise<Uint8Array> {
  return renderReport(view as ReportView);
}
