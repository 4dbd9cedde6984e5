import { listParcels } from "#app/features/parcels/list-parcels.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { csvResponse } from "#app/web/csv-response.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list-csv";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const itemNumber = url.searchParams.get("item")?.slice(0, 24) || undefined;
  let page = await orResponse(listParcels(ctx, { itemNumber, limit: 500 }));
  async function* rows() {
    for (;;) {
      for (const row of page.parcels) yield [row.name, row.itemNumber ?? "", String(row.rowCount), row.mainName, String(row.oddCount), row.savedAt.toISOString(), row.savedBy];
      if (!page.nextCursor) return;
      page = await listParcels(ctx, { itemNumber, after: page.nextCursor, limit: 500 });
    }
  }
  return csvResponse({ fileName: "parcels.csv", header: ["parcel", "item", "stones", "mostly", "stand apart", "saved at (UTC)", "by"], rows: rows() });
}
