import { ApiError } from "./api-error.ts";
import { fieldsOf, listOf, textOf, type FormFields, type FormValue } from "./parse-form.ts";
import { newStripeId, nowSeconds, type LineItem, type Session, type StripeState } from "./state.ts";
import type { Webhooks } from "./webhooks.ts";

type Deps = { state: StripeState; webhooks: Webhooks; origin: string };

export const sessionFields = [
  "mode",
  "line_items",
  "success_url",
  "cancel_url",
  "client_reference_id",
  "customer_email",
  "metadata",
  "payment_intent_data",
  "payment_method_types",
  "expires_at",
  "locale",
  "submit_type",
];
const daySeconds = 86_400;

export function createSession({ state, origin }: Deps, fields: FormFields): Session {
  if (fields.mode !== "payment") throw new ApiError(400, "This stand-in knows Checkout Sessions with mode: payment only.", { param: "mode", code: "parameter_missing" });
  const successUrl = absoluteUrl(fields, "success_url");
  if (!successUrl) throw missing("success_url");
  const items = listOf(fields.line_items).map((item, index) => lineItem(fieldsOf(item), index));
  if (items.length === 0) throw missing("line_items");
  if (new Set(items.map(({ currency }) => currency)).size > 1) throw new ApiError(400, "All line items must have the same currency.", { param: "line_items" });

  const id = newStripeId("cs_test");
  const created = nowSeconds();
  const amount = items.reduce((sum, item) => sum + item.amount_total, 0);
  const session: Session = {
    id,
    object: "checkout.session",
    mode: "payment",
    status: "open",
    payment_status: "unpaid",
    amount_subtotal: amount,
    amount_total: amount,
    currency: items[0]!.currency,
    client_reference_id: textOf(fields.client_reference_id),
    customer_email: textOf(fields.customer_email),
    metadata: metadataOf(fields.metadata),
    success_url: successUrl,
    cancel_url: absoluteUrl(fields, "cancel_url"),
    payment_intent: null,
    created,
    expires_at: expiryOf(fields, created),
    livemode: false,
    url: `${origin}/pay/${id}`,
  };
  const intentData = fieldsOf(fields.payment_intent_data);
  state.data.sessions[id] = session;
  state.data.lineItems[id] = items;
  state.data.intentData[id] = { description: textOf(intentData.description), metadata: metadataOf(intentData.metadata) };
  state.save();
  return session;
}

/** An open session past its time is expired when somebody looks. */
export function getSession(deps: Pick<Deps, "state" | "webhooks">, id: string): Session {
  const session = deps.state.data.sessions[id];
  if (!session) throw new ApiError(404, `No such checkout.session: '${id}'`, { code: "resource_missing", param: "session" });
  if (session.status === "open" && session.expires_at <= nowSeconds()) expire(deps, session);
  return session;
}

export function expireSession(deps: Pick<Deps, "state" | "webhooks">, id: string): Session {
  const session = getSession(deps, id);
  if (session.status !== "open") throw new ApiError(400, `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of \`${session.status}\`.`);
  expire(deps, session);
  return session;
}

export function metadataOf(value: FormValue | undefined): Record<string, string> {
  return Object.fromEntries(Object.entries(fieldsOf(value)).filter((entry): entry is [string, string] => typeof entry[1] === "string" && entry[1] !== ""));
}

export function wholeNumber(value: FormValue | undefined, param: string): number {
  if (typeof value !== "string" || !/^-?\d{1,15}$/.test(value)) throw new ApiError(400, `Invalid integer: ${typeof value === "string" ? value : "(none)"}`, { param, code: "parameter_invalid_integer" });
  return Number(value);
}

function expire({ state, webhooks }: Pick<Deps, "state" | "webhooks">, session: Session): void {
  session.status = "expired";
  session.url = null;
  state.save();
  void webhooks.emit("checkout.session.expired", session);
}

function lineItem(item: FormFields, index: number): LineItem {
  const param = `line_items[${index}][price_data]`;
  const price = fieldsOf(item.price_data);
  const currency = textOf(price.currency)?.toLowerCase();
  if (!currency || !/^[a-z]{3}$/.test(currency)) throw new ApiError(400, `Invalid currency: ${currency ?? "(none)"}`, { param: `${param}[currency]` });
  const description = textOf(fieldsOf(price.product_data).name);
  if (!description) throw missing(`${param}[product_data][name]`);
  const unitAmount = wholeNumber(price.unit_amount, `${param}[unit_amount]`);
  const quantity = wholeNumber(item.quantity, `line_items[${index}][quantity]`);
  if (unitAmount < 0 || quantity < 1) throw new ApiError(400, "Amounts must not be negative and quantities at least 1.", { param });
  return { id: newStripeId("li"), object: "item", description, quantity, amount_total: unitAmount * quantity, currency };
}

function expiryOf(fields: FormFields, created: number): number {
  if (fields.expires_at === undefined) return created + daySeconds;
  const expiresAt = wholeNumber(fields.expires_at, "expires_at");
  // As the service has it: from 30 minutes to 24 hours after creation.
  if (expiresAt < created + 1_795 || expiresAt > created + daySeconds + 5) throw new ApiError(400, "The `expires_at` timestamp must be between 30 minutes and 24 hours from Checkout Session creation.", { param: "expires_at" });
  return expiresAt;
}

function absoluteUrl(fields: FormFields, param: string): string | null {
  const text = textOf(fields[param]);
  if (text && !/^https?:\/\//.test(text)) throw new ApiError(400, `Not a valid URL: ${text}`, { param, code: "url_invalid" });
  return text;
}

function missing(param: string): ApiError {
  return new ApiError(400, `Missing required param: ${param}.`, { param, code: "parameter_missing" });
}
