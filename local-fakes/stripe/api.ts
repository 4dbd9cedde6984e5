import { ApiError } from "./api-error.ts";
import { createSession, expireSession, getSession, sessionFields } from "./checkout-sessions.ts";
import { listFields, listPage } from "./list.ts";
import { listOf, textOf, type FormFields } from "./parse-form.ts";
import { createRefund, refundFields } from "./refunds.ts";
import type { Session, StripeState } from "./state.ts";
import type { Webhooks } from "./webhooks.ts";

type Deps = { state: StripeState; webhooks: Webhooks; origin: string };
type Call = { method: string; path: RegExp; fields: string[]; run: (deps: Deps, fields: FormFields, id: string) => unknown };

const calls: Call[] = [
  { method: "POST", path: /^\/v1\/checkout\/sessions$/, fields: sessionFields, run: createSession },
  {
    method: "GET",
    path: /^\/v1\/checkout\/sessions$/,
    fields: [...listFields, "status", "payment_intent"],
    run: ({ state }, fields) =>
      listPage({ path: "/v1/checkout/sessions", fields, all: Object.values(state.data.sessions).filter((session) => matches(session, fields, ["status", "payment_intent"])) }),
  },
  { method: "GET", path: /^\/v1\/checkout\/sessions\/(\w+)$/, fields: ["expand"], run: (deps, fields, id) => expanded(deps, getSession(deps, id), fields) },
  {
    method: "GET",
    path: /^\/v1\/checkout\/sessions\/(\w+)\/line_items$/,
    fields: ["limit"],
    run: (deps, _fields, id) => ({ object: "list", url: `/v1/checkout/sessions/${id}/line_items`, has_more: false, data: deps.state.data.lineItems[getSession(deps, id).id] ?? [] }),
  },
  { method: "POST", path: /^\/v1\/checkout\/sessions\/(\w+)\/expire$/, fields: [], run: (deps, _fields, id) => expireSession(deps, id) },
  { method: "GET", path: /^\/v1\/payment_intents$/, fields: listFields, run: ({ state }, fields) => listPage({ path: "/v1/payment_intents", fields, all: Object.values(state.data.intents) }) },
  { method: "GET", path: /^\/v1\/payment_intents\/(\w+)$/, fields: ["expand"], run: ({ state }, fields, id) => expandedIntent(state, id, expandOf(fields)) },
  { method: "GET", path: /^\/v1\/charges\/(\w+)$/, fields: [], run: ({ state }, _fields, id) => found(state.data.charges[id], "charge", id) },
  { method: "POST", path: /^\/v1\/refunds$/, fields: refundFields, run: createRefund },
  {
    method: "GET",
    path: /^\/v1\/refunds$/,
    fields: [...listFields, "payment_intent", "charge"],
    run: ({ state }, fields) => listPage({ path: "/v1/refunds", fields, all: Object.values(state.data.refunds).filter((refund) => matches(refund, fields, ["payment_intent", "charge"])) }),
  },
  { method: "GET", path: /^\/v1\/refunds\/(\w+)$/, fields: [], run: ({ state }, _fields, id) => found(state.data.refunds[id], "refund", id) },
  {
    method: "GET",
    path: /^\/v1\/events$/,
    fields: [...listFields, "type", "types"],
    run: ({ state }, fields) => {
      const types = [textOf(fields.type), ...listOf(fields.types)].filter(Boolean);
      const all = Object.values(state.data.events).map(({ event }) => event);
      return listPage({ path: "/v1/events", fields, all: types.length > 0 ? all.filter(({ type }) => types.includes(type)) : all });
    },
  },
  { method: "GET", path: /^\/v1\/events\/(\w+)$/, fields: [], run: ({ state }, _fields, id) => found(state.data.events[id]?.event, "event", id) },
];

/** Answers one call. What is not known here is refused, never guessed: neither a call nor one of its parameters. */
export function callApi(deps: Deps, { method, path, fields }: { method: string; path: string; fields: FormFields }): unknown {
  const call = calls.find((candidate) => candidate.method === method && candidate.path.test(path));
  if (!call) throw new ApiError(404, `Unrecognized request URL (${method}: ${path}). The local stand-in for Stripe does not know this call.`);
  const unknown = Object.keys(fields).find((name) => !call.fields.includes(name));
  if (unknown) throw new ApiError(400, `Received unknown parameter: ${unknown} (the local stand-in for Stripe does not know it here)`, { param: unknown, code: "parameter_unknown" });
  return call.run(deps, fields, call.path.exec(path)?.[1] ?? "");
}

function found<T>(object: T | undefined, noun: string, id: string): T {
  if (!object) throw new ApiError(404, `No such ${noun}: '${id}'`, { code: "resource_missing", param: "id" });
  return object;
}

function matches<T extends object>(object: T, fields: FormFields, names: (keyof T & string)[]): boolean {
  return names.every((name) => fields[name] === undefined || fields[name] === object[name]);
}

function expandOf(fields: FormFields): string[] {
  return listOf(fields.expand).filter((path): path is string => typeof path === "string");
}

function expanded({ state }: Deps, session: Session, fields: FormFields): unknown {
  const paths = expandOf(fields);
  const unknown = paths.find((path) => !["payment_intent", "payment_intent.latest_charge", "line_items"].includes(path));
  if (unknown) throw new ApiError(400, `This property cannot be expanded (${unknown}).`, { param: "expand" });
  const intentPaths = paths.filter((path) => path.startsWith("payment_intent.")).map((path) => path.slice("payment_intent.".length));
  return {
    ...session,
    ...(paths.some((path) => path.startsWith("payment_intent")) && session.payment_intent && { payment_intent: expandedIntent(state, session.payment_intent, intentPaths) }),
    ...(paths.includes("line_items") && { line_items: { object: "list", has_more: false, data: state.data.lineItems[session.id] ?? [] } }),
  };
}

function expandedIntent(state: StripeState, id: string, paths: string[]): unknown {
  const intent = found(state.data.intents[id], "payment_intent", id);
  const unknown = paths.find((path) => path !== "latest_charge");
  if (unknown) throw new ApiError(400, `This property cannot be expanded (${unknown}).`, { param: "expand" });
  return paths.length > 0 && intent.latest_charge ? { ...intent, latest_charge: state.data.charges[intent.latest_charge] } : intent;
}
