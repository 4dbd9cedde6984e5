import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { outgoingMail, payments, providerEvents } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { handleStripeEvent } from "#app/features/payments/handle-stripe-event.server.ts";
import { startCheckout } from "#app/features/payments/start-checkout.server.ts";
import type { FakeStripe } from "#fakes/stripe/server.ts";
import { anInvoice, invoiceRow } from "../../setup/an-invoice.ts";
import { aLab, testNow } from "../../setup/factories.ts";
import { stripeServices } from "../../setup/stripe-services.ts";
import { sized } from "../../setup/torture.ts";

// Quality bar T5: 10,000 deliveries in `npm run torture`, a tenth in every run. The final state must be that of one ordered delivery each.
const scenarios = [
  { name: "paid", refundsMinor: [] as number[], expected: "paid" },
  { name: "paid and given back whole", refundsMinor: [13800], expected: "refunded" },
  { name: "paid and given back in part", refundsMinor: [800], expected: "paid" },
  { name: "paid and given back in three parts", refundsMinor: [4000, 4000, 5800], expected: "refunded" },
] as const;

function appOf(lab: LabContext): AppContext {
  return { db: lab.db, now: testNow, services: lab.services, clientAddress: "127.0.0.1" };
}

function eventsOf(fake: FakeStripe) {
  return Object.values(fake.data.events).map(({ event }) => event);
}

function signed(lab: LabContext, event: unknown) {
  const rawBody = JSON.stringify(event);
  const signature = lab.services.stripe.webhooks.generateTestHeaderString({ payload: rawBody, secret: lab.services.stripeWebhookSecret });
  return { rawBody, signature };
}

/** Deterministic shuffle; the seed is in the test's name. */
function shuffled<T>(items: readonly T[], seed: number): T[] {
  let state = seed;
  const random = () => ((state = (state * 1664525 + 1013904223) % 2 ** 32) / 2 ** 32);
  return items.map((item) => ({ item, key: random() })).sort((a, b) => a.key - b.key).map(({ item }) => item);
}

test.each(scenarios.flatMap((scenario) => Array.from({ length: sized({ always: 5, whole: 50 }) }, (_, at) => 11 + at).map((seed) => ({ ...scenario, seed }))))(
  "$name: 50 deliveries of its events in any order, repeated, eight at a time, end as one would (seed $seed)",
  async ({ refundsMinor, expected, seed }) => {
    await using stripe = await stripeServices();
    const lab = await aLab({ services: stripe.services });
    const app = appOf(lab);
    const invoice = await anInvoice(lab);
    await startCheckout(app, { payToken: invoice.payToken });
    const [session] = Object.values(stripe.fake.data.sessions);
    await stripe.fake.pay(session!.id);
    const intent = Object.keys(stripe.fake.data.intents)[0]!;
    for (const amount of refundsMinor) await stripe.services.stripe.refunds.create({ payment_intent: intent, amount });

    const events = eventsOf(stripe.fake);
    expect(events.length).toBeGreaterThanOrEqual(1 + refundsMinor.length);
    const deliveries = shuffled(Array.from({ length: 50 }, (_, i) => events[i % events.length]!), seed);
    for (let at = 0; at < deliveries.length; at += 8) {
      await Promise.all(deliveries.slice(at, at + 8).map((event) => handleStripeEvent(app, signed(lab, event))));
    }

    expect((await invoiceRow(lab, invoice.id)).state).toBe(expected);
    const ledger = await lab.db.select().from(payments).where(eq(payments.invoiceId, invoice.id));
    expect(ledger.filter(({ kind }) => kind === "payment")).toHaveLength(1);
    expect(ledger.filter(({ kind }) => kind === "refund").map(({ amountMinor }) => -amountMinor).sort()).toEqual([...refundsMinor].sort());
    const receipts = await lab.db.select().from(outgoingMail).where(eq(outgoingMail.laboratoryId, lab.laboratoryId));
    expect(receipts.filter(({ kind }) => kind === "paymentReceived")).toHaveLength(1);
  },
  60_000,
);

test("an event that is already remembered has no second effect", async () => {
  await using stripe = await stripeServices();
  const lab = await aLab({ services: stripe.services });
  const app = appOf(lab);
  const invoice = await anInvoice(lab);
  await startCheckout(app, { payToken: invoice.payToken });
  await stripe.fake.pay(Object.keys(stripe.fake.data.sessions)[0]!);
  const event = eventsOf(stripe.fake).find(({ type }) => type === "checkout.session.completed")!;
  expect(await handleStripeEvent(app, signed(lab, event))).toBe("done");
  expect(await handleStripeEvent(app, signed(lab, event))).toBe("repeat");
});

test("a session that runs out unpaid makes room for a new one", async () => {
  await using stripe = await stripeServices();
  const lab = await aLab({ services: stripe.services });
  const app = appOf(lab);
  const invoice = await anInvoice(lab);
  const first = await startCheckout(app, { payToken: invoice.payToken });
  await stripe.services.stripe.checkout.sessions.expire(Object.keys(stripe.fake.data.sessions)[0]!);
  const event = eventsOf(stripe.fake).find(({ type }) => type === "checkout.session.expired")!;
  await handleStripeEvent(app, signed(lab, event));
  expect((await invoiceRow(lab, invoice.id)).checkoutSessionId).toBeNull();
  expect(await startCheckout(app, { payToken: invoice.payToken })).not.toBe(first);
});

test("an event about something that is not ours is remembered and ignored", async () => {
  await using stripe = await stripeServices();
  const lab = await aLab({ services: stripe.services });
  const event = { id: `evt_foreign_${lab.laboratory.prefix}`, object: "event", type: "customer.created", data: { object: { id: "cus_1", object: "customer" } } };
  expect(await handleStripeEvent(appOf(lab), signed(lab, event))).toBe("ignored");
  const [row] = await lab.db.select().from(providerEvents).where(eq(providerEvents.eventId, event.id));
  expect(row).toMatchObject({ effect: "nothing to do" });
});
