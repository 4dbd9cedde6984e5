import type { LabContext } from "#app/features/lab-context.ts";
import { listStones, type StoneListItem, type StoneQuery } from "./list-stones.server.ts";

/** All stones of a query, a page at a time, so that an export never holds the whole book. */
export async function* eachStone(ctx: LabContext, query: Omit<StoneQuery, "after" | "before" | "pageSize">): AsyncGenerator<StoneListItem> {
  let page = await listStones(ctx, { ...query, pageSize: 500 });
  for (;;) {
    yield* page.stones;
    if (!page.later) return;
    page = await listStones(ctx, { ...query, after: page.later, pageSize: 500 });
  }
}
