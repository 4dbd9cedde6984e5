import { ApiError } from "./api-error.ts";
import { metadataOf, wholeNumber } from "./checkout-sessions.ts";
import { textOf, type FormFields } from "./parse-form.ts";
import { newStripeId, nowSeconds, type Refund, type StripeState } from "./state.ts";
import type { Webhooks } from "./webhooks.ts";

export const refundFields = ["payment_intent", "charge", "amount", "reason", "metadata"];

export function createRefund({ state, webhooks }: { state: StripeState; webhooks: Webhooks }, fields: FormFields): Refund {
  const intentId = textOf(fields.payment_intent);
  const chargeId = textOf(fields.charge) ?? (intentId && state.data.intents[intentId]?.latest_charge);
  if (intentId && !state.data.intents[intentId]) throw new ApiError(404, `No such payment_intent: '${intentId}'`, { code: "resource_missing", param: "payment_intent" });
  const charge = chargeId ? state.data.charges[chargeId] : undefined;
  if (!charge) throw new ApiError(400, "There is no successful charge to refund.", { param: intentId ? "payment_intent" : "charge" });

  const leftAmount = charge.amount - charge.amount_refunded;
  if (leftAmount === 0) throw new ApiError(400, `Charge ${charge.id} has already been refunded.`, { code: "charge_already_refunded" });
  const amount = fields.amount === undefined ? leftAmount : wholeNumber(fields.amount, "amount");
  if (amount < 1 || amount > leftAmount) throw new ApiError(400, `Refund amount (${amount}) is greater than unrefunded amount on charge (${leftAmount}), or less than 1.`, { param: "amount" });

  charge.amount_refunded += amount;
  charge.refunded = charge.amount_refunded === charge.amount;
  const refund: Refund = {
    id: newStripeId("re"),
    object: "refund",
    amount,
    currency: charge.currency,
    payment_intent: charge.payment_intent,
    charge: charge.id,
    reason: textOf(fields.reason),
    status: "succeeded",
    metadata: metadataOf(fields.metadata),
    created: nowSeconds(),
  };
  state.data.refunds[refund.id] = refund;
  state.save();
  void webhooks.emit("refund.created", refund);
  void webhooks.emit("charge.refunded", charge);
  return refund;
}
