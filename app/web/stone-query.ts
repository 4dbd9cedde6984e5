import { dueFilters, stoneSorts, stoneStateFilters, type DueFilter, type StoneSort, type StoneStateFilter } from "#app/features/stones/stone-filter.ts";
import type { ClientId, StoneId, UserId } from "#app/domain/ids.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { readRefCursor } from "./ref-cursor.ts";

export type StoneAddress = {
  state?: StoneStateFilter;
  due?: DueFilter;
  sort: StoneSort;
  isTurned: boolean;
  clientId?: ClientId;
  holderId?: UserId;
  search: string;
  after?: { key: string; id: StoneId };
  before?: { key: string; id: StoneId };
};

/** The logbook's filters, order and place as its address has them; what makes no sense there is left out. */
export function readStoneQuery(params: URLSearchParams): StoneAddress {
  const one = <T extends string>(name: string, known: readonly T[]) => known.find((value) => value === params.get(name));
  const sort = one("sort", stoneSorts) ?? "received";
  const direction = one("direction", ["asc", "desc"] as const) ?? (sort === "due" ? "asc" : "desc");
  const keyShape = /^(?:\d{1,15}|\d{4}-\d{2}-\d{2})$/;
  return {
    state: one("state", stoneStateFilters),
    due: one("due", dueFilters),
    sort,
    isTurned: direction === (sort === "due" ? "desc" : "asc"),
    clientId: idFromShortRef<"client">(params.get("client") ?? ""),
    holderId: idFromShortRef<"user">(params.get("with") ?? ""),
    search: (params.get("q") ?? "").slice(0, 100),
    after: readRefCursor<"stone">(params.get("after"), keyShape),
    before: readRefCursor<"stone">(params.get("before"), keyShape),
  };
}
