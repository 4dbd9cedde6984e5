import { simpleParser } from "mailparser";
import nodemailer from "nodemailer";
import { expect, test } from "vitest";
import type { Email } from "#app/emails/compose-email.ts";
import { confirmEmailEmail } from "#app/emails/confirm-email-email.ts";
import { inviteClientEmail } from "#app/emails/invite-client-email.ts";
import { inviteStaffEmail } from "#app/emails/invite-staff-email.ts";
import { invoiceToPayEmail } from "#app/emails/invoice-to-pay-email.ts";
import { passwordChangedEmail } from "#app/emails/password-changed-email.ts";
import { paymentReceivedEmail } from "#app/emails/payment-received-email.ts";
import { reportIssuedEmail } from "#app/emails/report-issued-email.ts";
import { reportWithdrawnEmail } from "#app/emails/report-withdrawn-email.ts";
import { resetPasswordEmail } from "#app/emails/reset-password-email.ts";
import { takeInReceiptEmail } from "#app/emails/take-in-receipt-email.ts";

const url = "https://isogyre.example/somewhere?token=abc&next=1";
type Words = { laboratoryName: string; recipientName: string; number: string; anything: string };
const calm: Words = { laboratoryName: "Marram Quay Gem Testing", recipientName: "Ines Ardenne", number: "MQ-R-26-00318", anything: "1 December 2026" };

/** Every letter, with the same words wherever a stranger's words can come in. */
const letters: Record<string, (words: Words) => Email> = {
  confirmEmail: ({ recipientName }) => confirmEmailEmail({ recipientName, url, validHours: 24 }),
  resetPassword: ({ recipientName }) => resetPasswordEmail({ recipientName, url, validMinutes: 30 }),
  passwordChanged: ({ recipientName, anything }) => passwordChangedEmail({ recipientName, changedAt: anything, url }),
  inviteStaff: ({ laboratoryName, recipientName, anything }) => inviteStaffEmail({ laboratoryName, invitedByName: anything, recipientName, roleNames: ["gemmologist", anything], url, validDays: 7 }),
  inviteClient: ({ laboratoryName, recipientName }) => inviteClientEmail({ laboratoryName, recipientName, url, validDays: 7 }),
  takeInReceipt: ({ laboratoryName, recipientName, number, anything }) => takeInReceiptEmail({ laboratoryName, recipientName, takeInNumber: number, receivedAt: anything, itemCount: 2, dueOn: anything }),
  invoiceToPay: ({ laboratoryName, recipientName, number, anything }) => invoiceToPayEmail({ laboratoryName, recipientName, invoiceNumber: number, takeInNumber: number, total: anything, issuedOn: anything, payUrl: url }),
  paymentReceived: ({ laboratoryName, recipientName, number, anything }) => paymentReceivedEmail({ laboratoryName, recipientName, invoiceNumber: number, total: anything, url }),
  reportIssued: ({ laboratoryName, recipientName, number }) => reportIssuedEmail({ laboratoryName, recipientName, reportNumber: number, url, verificationUrl: "https://isogyre.example/v/7KQ4M2XD9TPA3HZW" }),
  reportWithdrawn: ({ laboratoryName, recipientName, number, anything }) => reportWithdrawnEmail({ laboratoryName, recipientName, reportNumber: number, reasonClass: anything, url }),
};
const each = Object.entries(letters);

const asHostile = (text: string): Words => ({ laboratoryName: text, recipientName: text, number: text, anything: text });
/** What a reader sees of the HTML. */
const seen = (html: string) =>
  html
    .replace(/<style>.*?<\/style>/s, "")
    .replace(/<[^>]*>/g, " ")
    .replace(/&(lt|gt|quot|#39|nbsp|amp);/g, (_, name: string) => ({ lt: "<", gt: ">", quot: '"', "#39": "'", nbsp: " ", amp: "&" })[name]!)
    .replace(/\s+/g, " ");

test.each(each)("%s says the same in HTML and in text", (_name, compose) => {
  const { html, text } = compose(calm);
  for (const line of text.split("\n").filter(Boolean)) {
    const [label, value] = line.split(/: (?=\S)/, 2);
    for (const part of line.endsWith(":") ? [line.slice(0, -1)] : value ? [label!, value] : [line]) expect(seen(html)).toContain(part.trim());
  }
  expect(text).toContain("Dear Ines Ardenne,");
});

test.each(each)("%s is small, 600 px wide, styled for both rooms and asks nothing of other servers", (_name, compose) => {
  const { html } = compose(calm);
  expect(Buffer.byteLength(html)).toBeLessThan(20_000);
  expect(html).toContain('width="600"');
  expect(html).toContain("prefers-color-scheme:dark");
  expect(html).not.toMatch(/<(img|link|script|iframe|form|input)\b|url\(|@import|@font-face/i);
  const links = [...html.matchAll(/(?:href|src)="([^"]*)"/g)].map(([, link]) => link);
  expect(new Set(links)).toEqual(compose === letters.takeInReceipt ? new Set() : new Set([url.replace("&", "&amp;")]));
});

const markup = `"><script>alert(1)</script><img src=x onerror=alert(1)>'&amp;{{7*7}}`;

test.each(each)("%s shows markup in names as text", (_name, compose) => {
  const [tame, hostile] = [compose(calm).html, compose(asHostile(markup)).html];
  const tags = (html: string) => [...html.matchAll(/<\/?[a-z][^\s>]*/gi)].map(([tag]) => tag);
  // The stranger's words add no tag and no attribute: what is between the tags differs, and nothing else.
  expect(tags(hostile)).toEqual(tags(tame));
  expect(hostile).not.toMatch(/<[^>]*\sonerror/i);
});

test.each(each)("%s keeps to one subject line and its own headers", async (_name, compose) => {
  const letter = compose(asHostile("Marram\r\nBcc: all@example.org\r\n\r\n<p>body</p>\u0000\u2028\u202e"));
  expect(letter.subject).not.toMatch(/[\p{Cc}\u2028\u202e]/u);
  const sent = await nodemailer.createTransport({ streamTransport: true, buffer: true }).sendMail({ from: "desk@isogyre.example", to: "ines@example.org", ...letter });
  const mail = await simpleParser(sent.message as Buffer);
  expect(mail.bcc).toBeUndefined();
  expect(mail.subject).toBe(letter.subject);
  expect(mail.headers.has("bcc")).toBe(false);
});

test.each(each)("%s stays below 100 kB whatever is typed, and cuts no character in two", (_name, compose) => {
  const { html, subject, text } = compose(asHostile('"💎'.repeat(20_000)));
  expect(Buffer.byteLength(html)).toBeLessThan(100_000);
  expect(Buffer.byteLength(text)).toBeLessThan(100_000);
  expect(subject.length).toBeLessThanOrEqual(400);
  const loneHalf = /\p{Surrogate}/u;
  expect(subject).not.toMatch(loneHalf);
  expect(text).not.toMatch(loneHalf);
});

test.each(["Win at evil.example now", "https://evil.example", "me@evil.example", "//evil", ""])("the name %j is not repeated in a greeting", (recipientName) => {
  const { text, html } = letters.confirmEmail!({ ...calm, recipientName });
  expect(text).toContain("Good day,");
  expect(html).not.toContain("evil");
});

test.each(["Dr. J. R. Okafor", "J.R. Okafor", "O’Neill-Ström", "Ардèнн 石"])("the name %s is greeted as typed", (recipientName) => {
  expect(letters.confirmEmail!({ ...calm, recipientName }).text).toContain(`Dear ${recipientName},`);
});

test("a link that is no web page is refused", () => {
  expect(() => resetPasswordEmail({ recipientName: "Ines", url: "javascript:alert(1)", validMinutes: 30 })).toThrow("web pages only");
});

test("the letter about a report tells nothing of its content, and the one about a receipt no value", () => {
  expect(letters.reportIssued!(calm).text).not.toMatch(/ruby|corundum|ct\b|EUR/i);
  expect(letters.takeInReceipt!(calm).text).not.toMatch(/EUR|value|insured/i);
});
