import { timingSafeEqual } from "node:crypto";
import type { IncomingMessage, ServerResponse } from "node:http";
import { readBody } from "../read-body.ts";
import { redirect, sendJson, sendPage, serveLoopback } from "../serve-loopback.ts";
import { page } from "../page.ts";
import { answerOnce } from "./answer-once.ts";
import { ApiError } from "./api-error.ts";
import { callApi } from "./api.ts";
import { getSession } from "./checkout-sessions.ts";
import { controlPage } from "./control-page.ts";
import { parseForm } from "./parse-form.ts";
import { note, payPage } from "./pay-page.ts";
import { declineSession, paySession } from "./pay.ts";
import { newStripeId, openStripeState } from "./state.ts";
import { apiVersion, createWebhooks } from "./webhooks.ts";

export type FakeStripeOptions = {
  port?: number;
  secretKey?: string;
  webhookSecret?: string;
  /** Where events are sent; may be set later. */
  webhookUrl?: string;
  /** Kept there over restarts. */
  stateFile?: string;
  retryDelaysMs?: readonly number[];
};

/** A stand-in for Stripe on loopback: the slice of its API that we use, a page to pay on, signed webhooks. */
export async function startFakeStripe({ port, secretKey = "sk_test_stand_in", webhookSecret = "whsec_stand_in", webhookUrl, stateFile, retryDelaysMs }: FakeStripeOptions = {}) {
  const state = openStripeState(stateFile);
  const webhooks = createWebhooks({ state, secret: webhookSecret, url: webhookUrl, retryDelaysMs });

  const server = await serveLoopback({
    port,
    handlerFor: (origin) => async (request, response, url) => {
      if (url.pathname.startsWith("/v1/")) return answerApi(request, response, url, origin);
      if (url.pathname.startsWith("/pay/")) return answerPayPage(request, response, url.pathname.slice("/pay/".length));
      if (url.pathname === "/control" && request.method === "POST") return answerControl(request, response);
      if (url.pathname === "/" && request.method === "GET") return sendPage(response, controlPage(state, webhooks));
      sendPage(response, page({ title: "Not found", note, body: `<p>The stand-in for Stripe has nothing at this address. <a href="/">Events and sessions</a></p>` }), 404);
    },
  });

  async function answerApi(request: IncomingMessage, response: ServerResponse, url: URL, origin: string): Promise<void> {
    const raw = (await readBody(request)).toString("utf8");
    const headers = { "Request-Id": newStripeId("req"), "Stripe-Version": apiVersion };
    try {
      if (!isSame(request.headers.authorization ?? "", `Bearer ${secretKey}`)) throw new ApiError(401, "Invalid API Key provided");
      const method = request.method ?? "GET";
      const run = () => {
        const fields = parseForm(method === "POST" ? raw : url.search.slice(1));
        return { status: 200, body: callApi({ state, webhooks, origin }, { method, path: url.pathname, fields }) };
      };
      const key = request.headers["idempotency-key"];
      if (method === "POST" && typeof key === "string") {
        const { status, body, isReplayed } = answerOnce(state, { key, path: url.pathname, raw }, run);
        return sendJson(response, status, body, { ...headers, ...(isReplayed && { "Idempotent-Replayed": "true" }) });
      }
      const { status, body } = run();
      sendJson(response, status, body, headers);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      if (error.status === 404 && error.message.startsWith("Unrecognized")) console.warn(`stand-in for Stripe: ${error.message}`);
      sendJson(response, error.status, error.body, headers);
    }
  }

  async function answerPayPage(request: IncomingMessage, response: ServerResponse, id: string): Promise<void> {
    if (!state.data.sessions[id]) return sendPage(response, page({ title: "Not found", note, body: "<p>There is no such payment.</p>" }), 404);
    const session = getSession({ state, webhooks }, id);
    if (request.method !== "POST" || session.status !== "open") return sendPage(response, payPage(state, session));
    const { outcome } = parseForm((await readBody(request)).toString("utf8"));
    if (outcome === "pay") {
      await paySession({ state, webhooks }, session);
      return redirect(response, session.success_url.replaceAll("{CHECKOUT_SESSION_ID}", session.id));
    }
    if (outcome === "abandon" && session.cancel_url) return redirect(response, session.cancel_url);
    if (outcome === "decline") await declineSession({ state, webhooks }, session);
    redirect(response, `/pay/${session.id}`);
  }

  async function answerControl(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const { action, event } = parseForm((await readBody(request)).toString("utf8"));
    if (action === "hold") webhooks.hold();
    if (action === "release") await webhooks.release();
    if (action === "releaseReversed") await webhooks.release({ order: "reversed" });
    if (action === "deliver" && typeof event === "string" && state.data.events[event]) await webhooks.deliverAgain(event);
    if (action === "repeatReversed") for (const id of Object.keys(state.data.events).slice(-10).reverse()) await webhooks.deliverAgain(id);
    redirect(response, "/");
  }

  async function openSession(id: string) {
    const session = getSession({ state, webhooks }, id);
    if (session.status !== "open") throw new Error(`session ${id} is ${session.status}`);
    return session;
  }

  const close = async () => {
    await webhooks.stop();
    await server.close();
  };
  webhooks.resume();
  return {
    url: server.url,
    secretKey,
    webhookSecret,
    data: state.data,
    webhooks,
    /** What the buttons of the payment page do. */
    pay: async (sessionId: string) => paySession({ state, webhooks }, await openSession(sessionId)),
    decline: async (sessionId: string) => declineSession({ state, webhooks }, await openSession(sessionId)),
    close,
    [Symbol.asyncDispose]: close,
  };
}

export type FakeStripe = Awaited<ReturnType<typeof startFakeStripe>>;

function isSame(left: string, right: string): boolean {
  const [a, b] = [Buffer.from(left), Buffer.from(right)];
  return a.length === b.length && timingSafeEqual(a, b);
}
