import { examinationStateNames, goodsStateNames } from "#app/domain/stone-state.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { listStones } from "#app/features/stones/list-stones.server.ts";
import { eachStone } from "#app/features/stones/each-stone.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { readStoneQuery } from "#app/web/stone-query.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { after: _after, before: _before, ...query } = readStoneQuery(url.searchParams);
  // Asked once here, so that a refusal is an answer and not a broken download.
  await orResponse(listStones(ctx, { ...query, pageSize: 1 }));
  async function* rows() {
    for await (const stone of eachStone(ctx, query)) {
      yield [
        stone.code,
        stone.description,
        stone.weightText,
        stone.client,
        examinationStateNames[stone.examinationState],
        goodsStateNames[stone.goodsState],
        stone.place,
        stone.holder ?? "",
        calendarDateIn(stone.receivedAt, ctx.laboratory.timeZone),
        stone.dueOn,
      ];
    }
  }
  return csvResponse({ fileName: "logbook.csv", header: ["stone", "as received", "weight ct", "client", "state", "goods", "place", "with", "received", "due"], rows: rows() });
}
