import { filterInstruments, instrumentFilters, sortInstruments, type InstrumentFilter } from "#app/features/instruments/instrument-filter.ts";
import type { InstrumentListItem } from "#app/features/instruments/list-instruments.server.ts";

/** The instruments that an address asks for, in its order. */
export function readInstrumentQuery(url: URL): { filter: InstrumentFilter | null; choose: <Item extends InstrumentListItem>(instruments: readonly Item[], today: string) => Item[] } {
  const filter = instrumentFilters.find((known) => known === url.searchParams.get("show")) ?? null;
  const sort = { key: url.searchParams.get("sort"), isDescending: url.searchParams.get("direction") === "desc" };
  return { filter, choose: (instruments, today) => sortInstruments(filterInstruments(instruments, filter, today), sort) };
}
