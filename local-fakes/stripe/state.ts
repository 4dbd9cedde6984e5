import { randomBytes } from "node:crypto";
import { loadJson, saveJson } from "../json-file.ts";

type Metadata = Record<string, string>;
export type LineItem = { id: string; object: "item"; description: string; quantity: number; amount_total: number; currency: string };
export type Session = {
  id: string;
  object: "checkout.session";
  mode: "payment";
  status: "open" | "complete" | "expired";
  payment_status: "unpaid" | "paid";
  amount_subtotal: number;
  amount_total: number;
  currency: string;
  client_reference_id: string | null;
  customer_email: string | null;
  metadata: Metadata;
  success_url: string;
  cancel_url: string | null;
  payment_intent: string | null;
  created: number;
  expires_at: number;
  livemode: false;
  url: string | null;
};
export type Intent = {
  id: string;
  object: "payment_intent";
  amount: number;
  amount_received: number;
  currency: string;
  description: string | null;
  status: "requires_payment_method" | "succeeded";
  latest_charge: string | null;
  last_payment_error: { type: "card_error"; code: string; decline_code: string; message: string } | null;
  metadata: Metadata;
  created: number;
  livemode: false;
};
export type Charge = {
  id: string;
  object: "charge";
  amount: number;
  amount_captured: number;
  amount_refunded: number;
  refunded: boolean;
  currency: string;
  paid: true;
  status: "succeeded";
  payment_intent: string;
  metadata: Metadata;
  created: number;
  livemode: false;
};
export type Refund = {
  id: string;
  object: "refund";
  amount: number;
  currency: string;
  payment_intent: string;
  charge: string;
  reason: string | null;
  status: "succeeded";
  metadata: Metadata;
  created: number;
};
export type StripeEvent = {
  id: string;
  object: "event";
  api_version: string;
  created: number;
  livemode: false;
  pending_webhooks: number;
  request: { id: null; idempotency_key: null };
  type: string;
  data: { object: unknown };
};
export type EventRecord = { event: StripeEvent; isHeld: boolean; attempts: { at: number; status: number }[] };

export type StripeData = {
  isHolding: boolean;
  sessions: Record<string, Session>;
  lineItems: Record<string, LineItem[]>;
  /** What a session's payment intent will carry, by session. */
  intentData: Record<string, { description: string | null; metadata: Metadata }>;
  intents: Record<string, Intent>;
  charges: Record<string, Charge>;
  refunds: Record<string, Refund>;
  events: Record<string, EventRecord>;
  idempotency: Record<string, { path: string; raw: string; status: number; body: unknown }>;
};

export type StripeState = { data: StripeData; save: () => void };

/** @param file kept there, so that paid sessions are still paid after a restart */
export function openStripeState(file?: string): StripeState {
  const data = loadJson<StripeData>(file, {
    isHolding: false,
    sessions: {},
    lineItems: {},
    intentData: {},
    intents: {},
    charges: {},
    refunds: {},
    events: {},
    idempotency: {},
  });
  return { data, save: () => saveJson(file, data) };
}

export function newStripeId(prefix: string): string {
  return `${prefix}_${randomBytes(12).toString("hex")}`;
}

export function nowSeconds(): number {
  return Math.floor(Date.now() / 1000);
}
