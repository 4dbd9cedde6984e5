import { composeEmail, type Email } from "./compose-email.ts";

/** Says that goods were taken in: no value, no address, nothing of what they may be. */
export function takeInReceiptEmail({ laboratoryName, recipientName, takeInNumber, receivedAt, itemCount, dueOn }: { laboratoryName: string; recipientName: string; takeInNumber: string; receivedAt: string; itemCount: number; dueOn: string }): Email {
  return composeEmail({
    subject: `Taken in: ${takeInNumber}`,
    from: laboratoryName,
    heading: "We have taken your goods in",
    greetingName: recipientName,
    paragraphs: ["Thank you. The signed receipt is the document that counts; keep it, and bring it when you collect."],
    facts: [["Receipt", takeInNumber], ["Received", receivedAt], ["Items", String(itemCount)], ["Expected by", dueOn]],
  });
}
