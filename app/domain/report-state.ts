export const reportStates = ["draft", "authorised", "issued", "superseded", "withdrawn"] as const;
export type ReportState = (typeof reportStates)[number];

const moves: Readonly<Record<ReportState, readonly ReportState[]>> = {
  draft: ["authorised"],
  authorised: ["issued", "withdrawn"],
  issued: ["superseded", "withdrawn"],
  superseded: ["withdrawn"],
  withdrawn: [],
};

export function canMoveReport(from: ReportState, to: ReportState): boolean {
  return moves[from].includes(to);
}

export const reportStateNames: Readonly<Record<ReportState, string>> = {
  draft: "Draft",
  authorised: "Authorised",
  issued: "Issued",
  superseded: "Superseded",
  withdrawn: "Withdrawn",
};

/** The PDF's own state: a failure is a state with a reason and a retry, never a report stuck between two. */
export const pdfStates = ["none", "queued", "ready", "failed"] as const;
export type PdfState = (typeof pdfStates)[number];

/** Classes of reason that the public register may name (workflow 1.13). */
export const withdrawalReasons = ["identityError", "fraud", "duplicate", "courtOrder", "other"] as const;
export type WithdrawalReason = (typeof withdrawalReasons)[number];
export const withdrawalReasonNames: Readonly<Record<WithdrawalReason, string>> = {
  identityError: "an error in the identification",
  fraud: "suspected misuse",
  duplicate: "a second report on the same stone",
  courtOrder: "an order of a court or authority",
  other: "another reason held by the laboratory",
};
