import { and, eq } from "drizzle-orm";
import { clients, invoiceLines, invoices, laboratories } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AppContext } from "#app/features/app-context.ts";

/**
 * Opens, or finds still open, the Checkout Session of an invoice. The idempotency key holds the number of the attempt,
 * so a double click or a lost answer makes one session, and a new one is made only after the old one ran out.
 * @returns where to send the payer
 * @throws AppError not_found, conflict when nothing is due, unavailable when the payment service does not answer
 */
export async function startCheckout(app: AppContext, { payToken }: { payToken: string }): Promise<string> {
  const [invoice] = await app.db
    .select({
      laboratoryId: invoices.laboratoryId,
      id: invoices.id,
      number: invoices.number,
      state: invoices.state,
      currency: invoices.currency,
      totalMinor: invoices.totalMinor,
      sessionId: invoices.checkoutSessionId,
      attempt: invoices.checkoutAttempt,
      clientEmail: clients.email,
      laboratoryName: laboratories.name,
    })
    .from(invoices)
    .innerJoin(clients, and(eq(clients.laboratoryId, invoices.laboratoryId), eq(clients.id, invoices.clientId)))
    .innerJoin(laboratories, eq(laboratories.id, invoices.laboratoryId))
    .where(eq(invoices.payToken, payToken));
  if (!invoice) throw new AppError("not_found", "This payment link is not valid. Ask the laboratory for a new one.");
  if (invoice.state === "paid") throw new AppError("conflict", `Invoice ${invoice.number} is already paid. Nothing more is due.`);
  if (invoice.state !== "open") throw new AppError("conflict", `Invoice ${invoice.number} is no longer open. Nothing is due.`);

  const { stripe, publicOrigin } = app.services;
  try {
    if (invoice.sessionId) {
      const session = await stripe.checkout.sessions.retrieve(invoice.sessionId);
      if (session.status === "open" && session.url) return session.url;
      if (session.payment_status === "paid") throw new AppError("conflict", `Invoice ${invoice.number} was paid a moment ago. Its receipt is on its way.`);
    }
    const lines = await app.db
      .select()
      .from(invoiceLines)
      .where(and(eq(invoiceLines.laboratoryId, invoice.laboratoryId), eq(invoiceLines.invoiceId, invoice.id)))
      .orderBy(invoiceLines.position);
    const attempt = invoice.attempt + 1;
    const metadata = { laboratory_id: invoice.laboratoryId, invoice_id: invoice.id };
    const session = await stripe.checkout.sessions.create(
      {
        mode: "payment",
        client_reference_id: invoice.id,
        ...(invoice.clientEmail && { customer_email: invoice.clientEmail }),
        line_items: lines.map((line) => ({
          // The line's net and tax in one amount: tax is ours to compute, once, by line.
          price_data: {
            currency: invoice.currency.toLowerCase(),
            unit_amount: line.netMinor + line.taxMinor,
            product_data: { name: line.quantity === 1 ? line.label : `${line.label} × ${line.quantity}` },
          },
          quantity: 1,
        })),
        metadata,
        payment_intent_data: { metadata, description: `${invoice.laboratoryName}, invoice ${invoice.number}` },
        success_url: `${publicOrigin}/pay/${payToken}?returned=paid`,
        cancel_url: `${publicOrigin}/pay/${payToken}?returned=not-paid`,
      },
      { idempotencyKey: `invoice-${invoice.id}-${attempt}` },
    );
    await app.db
      .update(invoices)
      .set({ checkoutSessionId: session.id, checkoutAttempt: attempt })
      .where(and(eq(invoices.laboratoryId, invoice.laboratoryId), eq(invoices.id, invoice.id), eq(invoices.checkoutAttempt, invoice.attempt)));
    if (!session.url) throw new Error(`checkout session ${session.id} has no page`);
    return session.url;
  } catch (error) {
    if (error instanceof AppError) throw error;
    throw new AppError("unavailable", "The payment service could not be reached. Nothing was charged. Try again in a minute.", { cause: error, retryAfterS: 60 });
  }
}
