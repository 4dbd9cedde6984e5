import { escapeHtml, formatInstant, page } from "../page.ts";
import { formatAmount } from "./format-amount.ts";
import { note } from "./pay-page.ts";
import type { EventRecord, StripeState } from "./state.ts";
import { isTaken, type Webhooks } from "./webhooks.ts";

/** Where a person repeats, holds back and reorders what the shop is told. */
export function controlPage(state: StripeState, webhooks: Webhooks): string {
  const events = Object.values(state.data.events).reverse();
  const sessions = Object.values(state.data.sessions).reverse();
  const heldCount = events.filter(({ isHeld }) => isHeld).length;
  const button = (action: string, label: string, extra = "") => `<form method="post" action="/control">${extra}<button name="action" value="${action}">${label}</button></form>`;
  return page({
    title: "Stand-in for Stripe",
    note,
    body: `
<p>Events go to <code>${escapeHtml(webhooks.getUrl() ?? "nowhere: no address is set")}</code>.</p>
<section class="card"><h2>Delivery</h2>
  <p>${state.data.isHolding ? `Events are <strong>held back</strong>; ${heldCount} waiting.` : "Events are delivered as they occur."}</p>
  ${state.data.isHolding ? button("release", "Release in order") + button("releaseReversed", "Release in reverse order") : button("hold", "Hold events back")}
  ${events.length > 1 ? button("repeatReversed", "Send the last ten again, newest first") : ""}
</section>
<h2>Events</h2>
${events.length === 0 ? "<p>None yet. One appears when a payment page is paid or a refund is made.</p>" : eventTable(events.slice(0, 200), button)}
<h2>Checkout sessions</h2>
${
  sessions.length === 0
    ? "<p>None yet. One appears when an invoice is about to be paid.</p>"
    : `<table><thead><tr><th scope="col">Session</th><th scope="col">Amount</th><th scope="col">State</th><th scope="col">Created</th></tr></thead><tbody>${sessions
        .slice(0, 200)
        .map(
          (session) =>
            `<tr><td>${session.url ? `<a href="/pay/${session.id}">${session.id}</a>` : session.id}</td><td class="number">${escapeHtml(formatAmount(session.amount_total, session.currency))}</td><td>${session.status}, ${session.payment_status}</td><td>${formatInstant(session.created * 1000)}</td></tr>`,
        )
        .join("")}</tbody></table>`
}`,
  });
}

function eventTable(events: EventRecord[], button: (action: string, label: string, extra: string) => string): string {
  const rows = events.map((record) => {
    const { event } = record;
    const id = `<input type="hidden" name="event" value="${event.id}">`;
    return `<tr><td>${escapeHtml(event.type)}<br><code>${event.id}</code></td><td>${formatInstant(event.created * 1000)}</td><td>${stateOf(record)}</td><td>${button("deliver", record.isHeld ? "Release this one" : "Send again", id)}</td></tr>`;
  });
  return `<table><thead><tr><th scope="col">Event</th><th scope="col">Occurred</th><th scope="col">Delivery</th><th scope="col">Action</th></tr></thead><tbody>${rows.join("")}</tbody></table>`;
}

function stateOf(record: EventRecord): string {
  if (record.isHeld) return "held back";
  const last = record.attempts.at(-1);
  const times = record.attempts.length === 1 ? "once" : `${record.attempts.length} times`;
  if (!last) return "not sent yet";
  const answer = last.status === 0 ? "no answer" : `answered ${last.status}`;
  return isTaken(record) ? `<span class="good">taken</span>, sent ${times}, last ${answer}` : `<span class="bad">not taken</span>, sent ${times}, last ${answer}`;
}
