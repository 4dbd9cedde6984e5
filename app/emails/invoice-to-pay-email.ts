import { composeEmail, type Email } from "./compose-email.ts";

type View = { laboratoryName: string; recipientName: string; invoiceNumber: string; takeInNumber: string; total: string; issuedOn: string; payUrl: string };

export function invoiceToPayEmail({ laboratoryName, recipientName, invoiceNumber, takeInNumber, total, issuedOn, payUrl }: View): Email {
  return composeEmail({
    subject: `Invoice ${invoiceNumber}`,
    from: laboratoryName,
    heading: `Invoice ${invoiceNumber}`,
    greetingName: recipientName,
    paragraphs: ["The fee was agreed when the goods were taken in. It does not depend on what they turn out to be."],
    facts: [["To pay", total], ["Invoice date", issuedOn], ["For receipt", takeInNumber]],
    button: { label: "See the invoice and pay", url: payUrl },
    footnotes: ["The report is issued when the fee is paid."],
  });
}
