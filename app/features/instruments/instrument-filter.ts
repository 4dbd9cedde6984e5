import type { InstrumentListItem } from "./list-instruments.server.ts";

/** What the list of instruments can be narrowed to. */
export const instrumentFilters = ["due", "outOfCheck", "outOfService", "recalled"] as const;
export type InstrumentFilter = (typeof instrumentFilters)[number];

export const instrumentFilterNames: Readonly<Record<InstrumentFilter, string>> = {
  due: "Check due today or before",
  outOfCheck: "Out of check",
  outOfService: "Out of service",
  recalled: "Readings called back",
};

/** @param today calendar date in the laboratory's zone */
export function filterInstruments<Item extends Pick<InstrumentListItem, "status" | "nextDueOn" | "outOfCheck" | "isRecalling">>(instruments: readonly Item[], filter: InstrumentFilter | null, today: string): Item[] {
  return instruments.filter(({ status, nextDueOn, outOfCheck, isRecalling }) => {
    switch (filter) {
      case "due":
        return status !== "outOfService" && (outOfCheck !== null || (nextDueOn !== null && nextDueOn <= today));
      case "outOfCheck":
        return outOfCheck !== null;
      case "outOfService":
        return status === "outOfService";
      case "recalled":
        return isRecalling;
      case null:
        return true;
    }
  });
}

/** By name as they come, or what is due first; without a date last. */
export function sortInstruments<Item extends Pick<InstrumentListItem, "nextDueOn">>(instruments: readonly Item[], sort: { key: string | null; isDescending: boolean }): Item[] {
  const inOrder = sort.key === "due" ? instruments.toSorted((a, b) => (a.nextDueOn ?? "9999").localeCompare(b.nextDueOn ?? "9999")) : [...instruments];
  return sort.isDescending ? inOrder.reverse() : inOrder;
}
