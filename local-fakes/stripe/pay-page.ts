import { escapeHtml, page } from "../page.ts";
import { formatAmount } from "./format-amount.ts";
import type { Session, StripeState } from "./state.ts";

export const note = "A local stand-in for Stripe. No card is asked for and no money moves.";

export function payPage(state: StripeState, session: Session): string {
  if (session.status !== "open") {
    const said = session.status === "complete" ? "This has been paid." : "This payment page has expired.";
    return page({ title: "Payment", note, body: `<p>${said}</p>` });
  }
  const items = state.data.lineItems[session.id] ?? [];
  const error = session.payment_intent ? state.data.intents[session.payment_intent]?.last_payment_error : null;
  return page({
    title: "Payment",
    note,
    body: `
<section class="card">
  <p class="amount">${escapeHtml(formatAmount(session.amount_total, session.currency))}</p>
  <table><caption>What is paid for</caption>
    <thead><tr><th scope="col">Item</th><th scope="col">Quantity</th><th scope="col">Amount</th></tr></thead>
    <tbody>${items.map((item) => `<tr><td>${escapeHtml(item.description)}</td><td class="number">${item.quantity}</td><td class="number">${escapeHtml(formatAmount(item.amount_total, item.currency))}</td></tr>`).join("")}</tbody>
  </table>
  ${session.customer_email ? `<p>For ${escapeHtml(session.customer_email)}</p>` : ""}
  ${error ? `<p role="alert" class="bad">The card was declined. Nothing was charged. Try again, or go back.</p>` : ""}
  <form method="post"><button class="main" name="outcome" value="pay">Pay</button></form>
  <form method="post"><button name="outcome" value="decline">Try a card that is declined</button></form>
  ${session.cancel_url ? `<form method="post"><button name="outcome" value="abandon">Go back without paying</button></form>` : ""}
</section>`,
  });
}
