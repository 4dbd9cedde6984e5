import { escapeHtml, formatInstant, page } from "../page.ts";
import type { ReceivedMessage } from "./message-store.ts";

const note = "A local stand-in for a mail server. Nothing leaves this machine: what the laboratory sends arrives here.";

export function listPage(messages: readonly ReceivedMessage[]): string {
  const rows = messages
    .slice(-500)
    .reverse()
    .map(
      (message) =>
        `<tr><td><a href="/messages/${message.id}">${escapeHtml(message.subject || "(no subject)")}</a></td><td>${escapeHtml(message.to.join(", "))}</td><td>${formatInstant(message.receivedAt)}</td></tr>`,
    );
  const table = `<table><caption>${messages.length === 1 ? "One message" : `${messages.length} messages`}, newest first</caption><thead><tr><th scope="col">Subject</th><th scope="col">To</th><th scope="col">Received</th></tr></thead><tbody>${rows.join("")}</tbody></table>
<p><form method="post" action="/clear"><button>Empty the mailbox</button></form></p>`;
  return page({ title: "Mailbox", note, body: messages.length === 0 ? "<p>No mail yet. Invitations, password links, invoices and reports appear here when they are sent.</p>" : table });
}

export function messagePage(message: ReceivedMessage): string {
  const attachments = message.attachments.map(({ name, type, sizeBytes }) => `${name || type} (${sizeBytes} bytes)`).join(", ");
  return page({
    title: message.subject || "(no subject)",
    note,
    body: `
<p><a href="/">Mailbox</a></p>
<dl><dt>From</dt><dd>${escapeHtml(message.from)}</dd><dt>To</dt><dd>${escapeHtml(message.to.join(", "))}</dd><dt>Received</dt><dd>${formatInstant(message.receivedAt)}</dd>${attachments ? `<dt>Attached</dt><dd>${escapeHtml(attachments)}</dd>` : ""}</dl>
${message.html ? `<h2>As sent</h2><iframe title="The message" sandbox="allow-popups allow-popups-to-escape-sandbox" srcdoc="${escapeHtml(`<base target="_blank">${message.html}`)}"></iframe>` : ""}
<h2>Plain text</h2>
<pre>${withLinks(message.text)}</pre>
<details><summary>Header lines</summary><pre>${escapeHtml(message.headers.map(([, line]) => line).join("\n"))}</pre></details>`,
  });
}

export function notFoundPage(): string {
  return page({ title: "Not found", note, body: `<p>There is no such message. <a href="/">Mailbox</a></p>` });
}

function withLinks(text: string): string {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .map((piece, index) => (index % 2 === 1 ? `<a href="${escapeHtml(piece)}">${escapeHtml(piece)}</a>` : escapeHtml(piece)))
    .join("");
}
