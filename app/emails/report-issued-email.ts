import { composeEmail, type Email } from "./compose-email.ts";

type View = { laboratoryName: string; recipientName: string; reportNumber: string; url: string; verificationUrl: string };

/** Says where the report is. It is not attached, and nothing of its content is told here. */
export function reportIssuedEmail({ laboratoryName, recipientName, reportNumber, url, verificationUrl }: View): Email {
  return composeEmail({
    subject: `Report ${reportNumber} is ready`,
    from: laboratoryName,
    heading: `Report ${reportNumber} is ready`,
    greetingName: recipientName,
    paragraphs: ["Your report is issued. Download it from your own pages; anybody who holds it can check it in the public register."],
    facts: [["Report", reportNumber], ["Register", verificationUrl]],
    button: { label: "Fetch the report", url },
  });
}
