/** What can be done about a reading whose instrument failed a check after it (workflow 1.15, nonconforming work). */
export const recallDeeds = ["remeasured", "accepted", "reportWithdrawn"] as const;
export type RecallDeed = (typeof recallDeeds)[number];

export const recallDeedNames: Readonly<Record<RecallDeed, string>> = {
  remeasured: "Measured again",
  accepted: "Accepted with a reason",
  reportWithdrawn: "Report withdrawn",
};

/** More are never shown at once: the oldest failures first, so that the list works itself down. */
export const mostRecalled = 300;
