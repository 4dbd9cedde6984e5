import { and, eq, sql } from "drizzle-orm";
import type Stripe from "stripe";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { invoices, providerEvents } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { isId, type InvoiceId, type LaboratoryId } from "#app/domain/ids.ts";
import { currencyCodes, type CurrencyCode } from "#app/domain/money/money.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { syncPayment, type PaymentTruth } from "./sync-payment.server.ts";

/** Beyond this an honest event never grows; a longer body is refused before it is read whole. */
export const largestEventBytes = 256 * 1024;

/**
 * One call of the payment provider. The signature is checked on the raw body; what happened is then asked from the
 * provider anew, so that neither the order nor the age of events matters; the event's id is written in the transaction of
 * its effect, so that a repeat has none. A failure in between flies on: the provider will deliver again.
 * @throws AppError invalid_input when the signature is not the provider's
 */
export async function handleStripeEvent(app: AppContext, { rawBody, signature }: { rawBody: string; signature: string | null }): Promise<"done" | "repeat" | "ignored"> {
  const { stripe, stripeWebhookSecret } = app.services;
  let event: Stripe.Event;
  try {
    event = await stripe.webhooks.constructEventAsync(rawBody, signature ?? "", stripeWebhookSecret);
  } catch (error) {
    throw new AppError("invalid_input", "The signature of this event is not valid.", { cause: error });
  }

  const [seen] = await app.db.select({ eventId: providerEvents.eventId }).from(providerEvents).where(eq(providerEvents.eventId, event.id));
  if (seen) return "repeat";

  const found = await truthOf(stripe, event);
  return inTransaction(app.db, async (tx) => {
    const object = event.data.object as { id?: string };
    const [inserted] = await tx
      .insert(providerEvents)
      .values({ eventId: event.id, type: event.type, objectId: object.id ?? "", laboratoryId: found?.laboratoryId ?? null, effect: "", receivedAt: app.now })
      .onDuplicateKeyUpdate({ set: { eventId: sql`${providerEvents.eventId}` } });
    if (inserted.affectedRows !== 1) return "repeat";
    const scope = found && { db: tx, laboratoryId: found.laboratoryId, actorId: null, now: app.now, services: app.services };
    const effect = !found ? "nothing to do" : found.truth ? await syncPayment(scope!, found.truth) : await forgetSession(scope!, found);
    await tx.update(providerEvents).set({ effect }).where(eq(providerEvents.eventId, event.id));
    return found ? "done" : "ignored";
  });
}

type Found = { laboratoryId: LaboratoryId; invoiceId: InvoiceId; sessionId: string; truth: PaymentTruth | null };

async function truthOf(stripe: Stripe, event: Stripe.Event): Promise<Found | undefined> {
  switch (event.type) {
    case "checkout.session.completed":
    case "checkout.session.async_payment_succeeded":
    case "checkout.session.expired": {
      const session = await stripe.checkout.sessions.retrieve(event.data.object.id);
      const owner = ownerOf(session.metadata);
      if (!owner) return undefined;
      const intentId = typeof session.payment_intent === "string" ? session.payment_intent : session.payment_intent?.id;
      const truth = session.payment_status === "paid" && intentId ? await paymentTruth(stripe, { ...owner, intentId }) : null;
      return { ...owner, sessionId: session.id, truth };
    }
    case "charge.refunded":
    case "payment_intent.succeeded": {
      const object = event.data.object;
      const intentId = object.object === "payment_intent" ? object.id : typeof object.payment_intent === "string" ? object.payment_intent : object.payment_intent?.id;
      if (!intentId) return undefined;
      const intent = await stripe.paymentIntents.retrieve(intentId);
      const owner = ownerOf(intent.metadata);
      return owner && { ...owner, sessionId: "", truth: await paymentTruth(stripe, { ...owner, intentId }) };
    }
    default:
      return undefined;
  }
}

async function paymentTruth(stripe: Stripe, { invoiceId, intentId }: { invoiceId: InvoiceId; intentId: string }): Promise<PaymentTruth | null> {
  const intent = await stripe.paymentIntents.retrieve(intentId);
  const currency = intent.currency.toUpperCase() as CurrencyCode;
  if (!currencyCodes.includes(currency)) return null;
  const refunds = await stripe.refunds.list({ payment_intent: intentId, limit: 100 });
  return {
    invoiceId,
    paymentReference: intentId,
    receivedMinor: intent.amount_received,
    currency,
    refunds: refunds.data.filter((refund) => refund.status === "succeeded").map((refund) => ({ reference: refund.id, amountMinor: refund.amount })),
  };
}

/** A session that ran out unpaid is forgotten, so that the pay link opens a new one. */
async function forgetSession(scope: { db: AppContext["db"]; laboratoryId: LaboratoryId }, { invoiceId, sessionId, laboratoryId }: Found): Promise<string> {
  const [result] = await scope.db
    .update(invoices)
    .set({ checkoutSessionId: null })
    .where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.id, invoiceId), eq(invoices.checkoutSessionId, sessionId)));
  return result.affectedRows === 1 ? "session ended unpaid" : "nothing new";
}

/** Which invoice we put into the session's metadata; anything else is not from us. */
function ownerOf(metadata: Stripe.Metadata | null): { laboratoryId: LaboratoryId; invoiceId: InvoiceId } | undefined {
  const laboratoryId = metadata?.laboratory_id ?? "";
  const invoiceId = metadata?.invoice_id ?? "";
  return isId(laboratoryId) && isId(invoiceId) ? { laboratoryId: laboratoryId as LaboratoryId, invoiceId: invoiceId as InvoiceId } : undefined;
}
