import { newStripeId, nowSeconds, type Intent, type Session, type StripeState } from "./state.ts";
import type { Webhooks } from "./webhooks.ts";

type Deps = { state: StripeState; webhooks: Webhooks };
/** How long the payer waits for the shop to hear of it before being sent back: so does the service. */
const longestWaitMs = 10_000;

/** Pays an open session; the answer comes when the shop has taken the news, or after ten seconds. */
export async function paySession({ state, webhooks }: Deps, session: Session): Promise<void> {
  const intent = intentOf(state, session);
  const charge = {
    id: newStripeId("ch"),
    object: "charge" as const,
    amount: intent.amount,
    amount_captured: intent.amount,
    amount_refunded: 0,
    refunded: false,
    currency: intent.currency,
    paid: true as const,
    status: "succeeded" as const,
    payment_intent: intent.id,
    metadata: intent.metadata,
    created: nowSeconds(),
    livemode: false as const,
  };
  state.data.charges[charge.id] = charge;
  Object.assign(intent, { status: "succeeded", amount_received: intent.amount, latest_charge: charge.id, last_payment_error: null } satisfies Partial<Intent>);
  Object.assign(session, { status: "complete", payment_status: "paid", url: null } satisfies Partial<Session>);
  state.save();
  const news = Promise.all([webhooks.emit("payment_intent.succeeded", intent), webhooks.emit("checkout.session.completed", session)]);
  let timer: NodeJS.Timeout | undefined;
  await Promise.race([news, new Promise((resolve) => (timer = setTimeout(resolve, longestWaitMs)))]);
  clearTimeout(timer);
}

/** The bank says no: the session stays open for another card. */
export async function declineSession({ state, webhooks }: Deps, session: Session): Promise<void> {
  const intent = intentOf(state, session);
  intent.last_payment_error = { type: "card_error", code: "card_declined", decline_code: "generic_decline", message: "Your card was declined." };
  state.save();
  void webhooks.emit("payment_intent.payment_failed", intent);
}

function intentOf(state: StripeState, session: Session): Intent {
  const existing = session.payment_intent && state.data.intents[session.payment_intent];
  if (existing) return existing;
  const { description, metadata } = state.data.intentData[session.id] ?? { description: null, metadata: {} };
  const intent: Intent = {
    id: newStripeId("pi"),
    object: "payment_intent",
    amount: session.amount_total,
    amount_received: 0,
    currency: session.currency,
    description,
    status: "requires_payment_method",
    latest_charge: null,
    last_payment_error: null,
    metadata,
    created: nowSeconds(),
    livemode: false,
  };
  state.data.intents[intent.id] = intent;
  session.payment_intent = intent.id;
  return intent;
}
