import { reportStates } from "#app/domain/report-state.ts";
import { listReports } from "#app/features/reports/list-reports.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const state = reportStates.find((known) => known === url.searchParams.get("state"));
  let page = await orResponse(listReports(ctx, { state, limit: 500 }));
  async function* rows() {
    for (;;) {
      for (const row of page.reports) yield [row.number ?? "", row.reportOn ?? "", row.stoneCode, row.description, row.clientName, row.state, String(row.version), row.issuedAt?.toISOString() ?? ""];
      if (!page.nextCursor) return;
      page = await listReports(ctx, { state, after: page.nextCursor, limit: 500 });
    }
  }
  return csvResponse({ fileName: "reports.csv", header: ["report", "date", "stone", "as received", "client", "state", "version", "issued at (UTC)"], rows: rows() });
}
