import type { ReportState } from "#app/domain/report-state.ts";

/** The colour that helps a report's word of state along. */
export const reportTones: Readonly<Record<ReportState, "green" | "straw" | "red" | "tint" | "plain">> = {
  draft: "plain",
  authorised: "straw",
  issued: "green",
  superseded: "plain",
  withdrawn: "red",
};
