import { parentPort } from "node:worker_threads";
import { renderReport } from "./render-report.ts";
import type { ReportView } from "./report-view.ts";

parentPort?.on("message", async ({ id, view }: { id: number; view: ReportView }) => {
  try {
    const pdf = await renderReport(view);
    // Handed over, not copied.
    parentPort?.postMessage({ id, pdf }, [pdf.buffer as ArrayBuffer]);
  } catch (error) {
    parentPort?.postMessage({ id, error: error instanceof Error ? error.message : String(error) });
  }
});
