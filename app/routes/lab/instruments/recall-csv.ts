import { observationKindNames } from "#app/domain/reading.ts";
import { recallDeedNames } from "#app/domain/recall.ts";
import { listRecall } from "#app/features/recalls/list-recall.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/recall-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const readings = await orResponse(listRecall(context.get(labContext), { show: url.searchParams.get("show") === "done" ? "done" : "open" }));
  async function* rows() {
    for (const row of readings) {
      yield [row.stoneCode, String(row.sequence), observationKindNames[row.kind], row.shown, row.observedAt.toISOString(), row.observer, row.instrument, row.failedOn, row.failedAt.toISOString(), row.reports.map(({ number, state }) => `${number} (${state})`).join("; "), row.done ? recallDeedNames[row.done.deed] : "", row.done?.reason ?? "", row.done?.by ?? "", row.done?.at.toISOString() ?? ""];
    }
  }
  return csvResponse({ fileName: "recall.csv", header: ["stone", "reading", "test", "shown", "read at (UTC)", "by", "instrument", "failed on", "failed at (UTC)", "reports", "done", "reason", "done by", "done at (UTC)"], rows: rows() });
}
