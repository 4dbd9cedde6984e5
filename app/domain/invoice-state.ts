export const invoiceStates = ["open", "paid", "refunded", "void"] as const;
export type InvoiceState = (typeof invoiceStates)[number];

const moves: Readonly<Record<InvoiceState, readonly InvoiceState[]>> = {
  open: ["paid", "void"],
  paid: ["refunded"],
  refunded: [],
  void: [],
};

export function canMoveInvoice(from: InvoiceState, to: InvoiceState): boolean {
  return moves[from].includes(to);
}

export const invoiceStateNames: Readonly<Record<InvoiceState, string>> = {
  open: "Open",
  paid: "Paid",
  refunded: "Refunded",
  void: "Void",
};
