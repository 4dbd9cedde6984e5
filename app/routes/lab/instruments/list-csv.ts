import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { instrumentKindNames } from "#app/domain/instrument-kind.ts";
import { instrumentStatusNames } from "#app/features/instruments/instrument-kinds.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { readInstrumentQuery } from "#app/web/instrument-query.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const instruments = readInstrumentQuery(url).choose(await orResponse(listInstruments(ctx)), calendarDateIn(ctx.now, ctx.laboratory.timeZone));
  async function* rows() {
    for (const row of instruments) yield [row.name, instrumentKindNames[row.kind], row.description, row.serial, row.location, instrumentStatusNames[row.status], row.statusReason, row.lastCheckedAt?.toISOString() ?? "", row.lastCheckedAt ? (row.isLastCheckPassed ? "passed" : "failed") : "", row.nextDueOn ?? "", row.outOfCheck ?? "", row.isCorrected ? "yes" : "no"];
  }
  return csvResponse({ fileName: "instruments.csv", header: ["name", "kind", "description", "serial", "place", "state", "why", "last check (UTC)", "outcome", "next check", "out of check because", "corrected"], rows: rows() });
}
