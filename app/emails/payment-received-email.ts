import { composeEmail, type Email } from "./compose-email.ts";

type View = { laboratoryName: string; recipientName: string; invoiceNumber: string; total: string; url: string };

export function paymentReceivedEmail({ laboratoryName, recipientName, invoiceNumber, total, url }: View): Email {
  return composeEmail({
    subject: `Receipt for invoice ${invoiceNumber}`,
    from: laboratoryName,
    heading: "Thank you, the fee is paid",
    greetingName: recipientName,
    paragraphs: [`We received the whole amount of invoice ${invoiceNumber}. Nothing more is due.`],
    facts: [["Invoice", invoiceNumber], ["Paid", total]],
    button: { label: "See the invoice", url },
  });
}
