/** Where the examination of a stone stands. Independent of where the goods are. */
export const examinationStates = [
  "received",
  "examining",
  "concluded",
  "checked",
  "authorised",
  "issued",
  "returned",
  "referred",
  "declined",
  "cancelled",
] as const;
export type ExaminationState = (typeof examinationStates)[number];

const examinationMoves: Readonly<Record<ExaminationState, readonly ExaminationState[]>> = {
  received: ["examining", "declined", "cancelled"],
  examining: ["concluded", "referred", "declined", "cancelled"],
  concluded: ["checked", "returned", "examining", "cancelled"],
  returned: ["examining", "cancelled"],
  referred: ["examining", "cancelled"],
  checked: ["authorised", "examining", "cancelled"],
  authorised: ["issued", "examining"],
  // Opened again for an amendment: the new report will supersede the old one.
  issued: ["examining"],
  declined: [],
  cancelled: [],
};

export function canMoveExamination(from: ExaminationState, to: ExaminationState): boolean {
  return examinationMoves[from].includes(to);
}

export const examinationStateNames: Readonly<Record<ExaminationState, string>> = {
  received: "Taken in",
  examining: "On the bench",
  concluded: "Second check",
  checked: "Checked",
  authorised: "Authorised",
  issued: "Issued",
  returned: "Returned by the check",
  referred: "Referred",
  declined: "Declined",
  cancelled: "Cancelled",
};

export const goodsStates = ["safe", "bench", "away", "released"] as const;
export type GoodsState = (typeof goodsStates)[number];

const goodsMoves: Readonly<Record<GoodsState, readonly GoodsState[]>> = {
  safe: ["safe", "bench", "away", "released"],
  bench: ["safe", "bench", "away"],
  away: ["safe", "bench"],
  released: [],
};

export function canMoveGoods(from: GoodsState, to: GoodsState): boolean {
  return goodsMoves[from].includes(to);
}

export const goodsStateNames: Readonly<Record<GoodsState, string>> = {
  safe: "In the safe",
  bench: "At the bench",
  away: "Away",
  released: "Released",
};
