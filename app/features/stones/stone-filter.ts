import type { ExaminationState, GoodsState } from "#app/domain/stone-state.ts";

/** What the logbook can be narrowed to, as it stands in the address. */
export const stoneStateFilters = ["house", "received", "examining", "concluded", "checked", "authorised", "issued", "returned", "referred", "declined", "cancelled", "released"] as const;
export type StoneStateFilter = (typeof stoneStateFilters)[number];

export const stoneStateFilterNames: Readonly<Record<StoneStateFilter, string>> = {
  house: "in the house",
  received: "taken in",
  examining: "on the bench",
  concluded: "second check",
  checked: "checked",
  authorised: "authorised",
  issued: "issued",
  returned: "returned by the check",
  referred: "referred",
  declined: "declined",
  cancelled: "cancelled",
  released: "released",
};

export const dueFilters = ["week", "overdue"] as const;
export type DueFilter = (typeof dueFilters)[number];
export const dueFilterNames: Readonly<Record<DueFilter, string>> = { week: "this week", overdue: "overdue" };

export const stoneSorts = ["received", "due"] as const;
export type StoneSort = (typeof stoneSorts)[number];

/** Stones on which work is still to be done: only these can be overdue. */
export const unfinishedStates: readonly ExaminationState[] = ["received", "examining", "concluded", "returned", "referred", "checked", "authorised"];
export const statesInTheHouse: readonly GoodsState[] = ["safe", "bench", "away"];
