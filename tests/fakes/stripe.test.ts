import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import Stripe from "stripe";
import { afterEach, beforeEach, expect, test } from "vitest";
import { createStripe } from "#app/integrations/stripe.server.ts";
import { startFakeStripe, type FakeStripe, type FakeStripeOptions } from "#fakes/stripe/server.ts";

let fake: FakeStripe;
let stripe: Stripe;
let shop: Server;
/** What the shop was sent: the raw body and its signature. */
let received: { body: string; signature: string }[];
/** What the shop answers, in turn; 200 when the list is empty. */
let answers: number[];

async function start(options: FakeStripeOptions = {}) {
  const { port } = shop.address() as AddressInfo;
  fake = await startFakeStripe({ webhookUrl: `http://127.0.0.1:${port}/`, retryDelaysMs: [5, 5], ...options });
  stripe = createStripe({ secretKey: fake.secretKey, apiUrl: fake.url });
}

beforeEach(async () => {
  received = [];
  answers = [];
  shop = createServer(async (request, response) => {
    let body = "";
    for await (const chunk of request) body += chunk;
    received.push({ body, signature: String(request.headers["stripe-signature"]) });
    response.writeHead(answers.shift() ?? 200).end();
  });
  await new Promise<void>((done) => shop.listen(0, "127.0.0.1", done));
  await start();
});
afterEach(async () => {
  await fake.close();
  shop.closeAllConnections();
  await new Promise((done) => shop.close(done));
});

function anInvoiceSession(options?: Stripe.RequestOptions) {
  return stripe.checkout.sessions.create(
    {
      mode: "payment",
      line_items: [{ quantity: 2, price_data: { currency: "eur", unit_amount: 8500, product_data: { name: "Identification" } } }],
      success_url: "http://127.0.0.1:9/paid?session={CHECKOUT_SESSION_ID}",
      cancel_url: "http://127.0.0.1:9/unpaid",
      metadata: { invoice: "MQ-I-26-0001" },
      payment_intent_data: { description: "Invoice MQ-I-26-0001" },
    },
    options,
  );
}

const press = (session: { id: string }, outcome: string) => fetch(`${fake.url}/pay/${session.id}`, { method: "POST", body: new URLSearchParams({ outcome }), redirect: "manual" });
const typesReceived = () => received.map(({ body }) => (JSON.parse(body) as Stripe.Event).type);

test("a session paid on its page is paid, and the shop hears of it under a valid signature", async () => {
  const session = await anInvoiceSession();
  expect(session).toMatchObject({ status: "open", payment_status: "unpaid", amount_total: 17000, currency: "eur", metadata: { invoice: "MQ-I-26-0001" } });
  const payPage = await (await fetch(session.url!)).text();
  expect(payPage).toContain("EUR");
  expect(payPage).toContain("170.00");
  expect(payPage).toContain("stand-in");

  const answer = await press(session, "pay");
  expect(answer.status).toBe(303);
  expect(answer.headers.get("location")).toBe(`http://127.0.0.1:9/paid?session=${session.id}`);

  const paid = await stripe.checkout.sessions.retrieve(session.id, { expand: ["payment_intent.latest_charge"] });
  expect(paid).toMatchObject({ status: "complete", payment_status: "paid", url: null });
  expect(paid.payment_intent).toMatchObject({ status: "succeeded", amount_received: 17000, description: "Invoice MQ-I-26-0001", latest_charge: { amount: 17000, refunded: false } });
  expect(typesReceived().sort()).toEqual(["checkout.session.completed", "payment_intent.succeeded"]);
  for (const { body, signature } of received) await expect(stripe.webhooks.constructEventAsync(body, signature, fake.webhookSecret)).resolves.toHaveProperty("object", "event");
});

test("an event with another secret, an altered body or an old signature is not accepted by the SDK", async () => {
  await fake.pay((await anInvoiceSession()).id);
  const { body, signature } = received[0]!;
  const refused = Stripe.errors.StripeSignatureVerificationError;
  await expect(stripe.webhooks.constructEventAsync(body, signature, "whsec_forged")).rejects.toThrow(refused);
  await expect(stripe.webhooks.constructEventAsync(body.replace("17000", "1"), signature, fake.webhookSecret)).rejects.toThrow(refused);
  const old = stripe.webhooks.generateTestHeaderString({ payload: body, secret: fake.webhookSecret, timestamp: Math.floor(Date.now() / 1000) - 301 });
  await expect(stripe.webhooks.constructEventAsync(body, old, fake.webhookSecret)).rejects.toThrow(refused);
});

test("a declined card leaves the session open, and says so", async () => {
  const session = await anInvoiceSession();
  const answer = await press(session, "decline");
  expect(answer.headers.get("location")).toBe(`/pay/${session.id}`);
  expect(await (await fetch(session.url!)).text()).toContain("declined");
  await fake.webhooks.settled();
  expect(typesReceived()).toEqual(["payment_intent.payment_failed"]);
  expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: "open", payment_status: "unpaid" });

  await press(session, "pay");
  expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ payment_status: "paid" });
});

test("going back without paying leads to the cancel address and charges nothing", async () => {
  const session = await anInvoiceSession();
  expect((await press(session, "abandon")).headers.get("location")).toBe("http://127.0.0.1:9/unpaid");
  expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: "open", payment_intent: null });
  expect(received).toEqual([]);
});

test("an expired session can no longer be paid", async () => {
  const session = await anInvoiceSession();
  expect(await stripe.checkout.sessions.expire(session.id)).toMatchObject({ status: "expired", url: null });
  await press(session, "pay");
  expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ status: "expired", payment_status: "unpaid" });
  await expect(stripe.checkout.sessions.expire(session.id)).rejects.toThrow("status of `expired`");
});

test("one idempotency key makes one session; with another amount it is a conflict", async () => {
  const first = await anInvoiceSession({ idempotencyKey: "invoice-1" });
  const second = await anInvoiceSession({ idempotencyKey: "invoice-1" });
  expect(second.id).toBe(first.id);
  expect(second.lastResponse.headers["idempotent-replayed"]).toBe("true");
  const other = stripe.checkout.sessions.create({ mode: "payment", success_url: "http://127.0.0.1:9/", line_items: [{ quantity: 1, price_data: { currency: "eur", unit_amount: 1, product_data: { name: "x" } } }] }, { idempotencyKey: "invoice-1" });
  await expect(other).rejects.toThrow(Stripe.errors.StripeIdempotencyError);
  expect((await stripe.checkout.sessions.list()).data).toHaveLength(1);
});

test("refunds add up to the charge and no further", async () => {
  const session = await anInvoiceSession();
  await fake.pay(session.id);
  const { payment_intent } = await stripe.checkout.sessions.retrieve(session.id);
  const intent = String(payment_intent);
  expect(await stripe.refunds.create({ payment_intent: intent, amount: 5000, reason: "requested_by_customer" })).toMatchObject({ status: "succeeded", amount: 5000 });
  await expect(stripe.refunds.create({ payment_intent: intent, amount: 12001 })).rejects.toThrow("greater than unrefunded amount");
  expect(await stripe.refunds.create({ payment_intent: intent })).toMatchObject({ amount: 12000 });
  await expect(stripe.refunds.create({ payment_intent: intent })).rejects.toMatchObject({ code: "charge_already_refunded" });
  expect((await stripe.refunds.list({ payment_intent: intent })).data.map(({ amount }) => amount)).toEqual([12000, 5000]);
  await fake.webhooks.settled();
  expect(typesReceived().filter((type) => type === "charge.refunded")).toHaveLength(2);
});

test("an event that the shop fails to take is sent again until it is taken", async () => {
  answers = [500, 500, 503];
  const session = await anInvoiceSession();
  await stripe.checkout.sessions.expire(session.id);
  await fake.webhooks.settled();
  expect(received.map(({ body }) => (JSON.parse(body) as Stripe.Event).id)).toHaveLength(3);
  expect(new Set(received.map(({ body }) => body)).size).toBe(1);
  const [event] = (await stripe.events.list({ types: ["checkout.session.expired"] })).data;
  await fake.webhooks.deliverAgain(event!.id);
  expect(received).toHaveLength(4);
});

test("events held back arrive when released, in the order asked for, as they were when they occurred", async () => {
  fake.webhooks.hold();
  const [first, second] = [await anInvoiceSession(), await anInvoiceSession()];
  await stripe.checkout.sessions.expire(first.id);
  await fake.decline(second.id);
  await fake.pay(second.id);
  expect(received).toEqual([]);
  await fake.webhooks.release({ order: "reversed" });
  expect(typesReceived()).toEqual(["checkout.session.completed", "payment_intent.succeeded", "payment_intent.payment_failed", "checkout.session.expired"]);
  const failed = JSON.parse(received[2]!.body) as Stripe.PaymentIntentPaymentFailedEvent;
  expect(failed.data.object.status).toBe("requires_payment_method");
});

test("the control page repeats, holds back and releases", async () => {
  const control = (fields: Record<string, string>) => fetch(`${fake.url}/control`, { method: "POST", body: new URLSearchParams(fields) });
  await control({ action: "hold" });
  await stripe.checkout.sessions.expire((await anInvoiceSession()).id);
  expect(await (await fetch(fake.url)).text()).toContain("held back");
  const [event] = (await stripe.events.list()).data;
  await control({ action: "release" });
  await control({ action: "deliver", event: event!.id });
  expect(typesReceived()).toEqual(["checkout.session.expired", "checkout.session.expired"]);
  expect(await (await fetch(fake.url)).text()).toContain("sent 2 times");
});

test("lists page by cursor, newest first", async () => {
  const made = [];
  for (let i = 0; i < 5; i++) made.push((await anInvoiceSession()).id);
  const ids: string[] = [];
  for await (const session of stripe.checkout.sessions.list({ limit: 2 })) ids.push(session.id);
  expect(ids).toEqual(made.reverse());
});

test("a paid session is still paid after a restart, and an event nobody took is sent then", async () => {
  const folder = mkdtempSync(path.join(tmpdir(), "isogyre-stripe-"));
  try {
    await fake.close();
    answers = Array.from({ length: 6 }, () => 503);
    await start({ stateFile: path.join(folder, "stripe.json") });
    const session = await anInvoiceSession();
    await fake.pay(session.id);
    await fake.close();
    received = [];
    await start({ stateFile: path.join(folder, "stripe.json") });
    await fake.webhooks.settled();
    expect(typesReceived().sort()).toEqual(["checkout.session.completed", "payment_intent.succeeded"]);
    expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ payment_status: "paid" });
  } finally {
    rmSync(folder, { recursive: true });
  }
});

test("what the stand-in does not know it refuses: a call, a parameter, a key, an object", async () => {
  await expect(stripe.customers.create({ email: "a@example.test" })).rejects.toThrow("does not know this call");
  await expect(stripe.checkout.sessions.list({ customer: "cus_1" })).rejects.toThrow("unknown parameter: customer");
  await expect(stripe.checkout.sessions.retrieve("cs_test_none")).rejects.toMatchObject({ code: "resource_missing", statusCode: 404 });
  await expect(createStripe({ secretKey: "sk_test_other", apiUrl: fake.url }).events.list()).rejects.toThrow(Stripe.errors.StripeAuthenticationError);
});
