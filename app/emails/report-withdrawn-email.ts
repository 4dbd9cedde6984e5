import { composeEmail, type Email } from "./compose-email.ts";

type View = { laboratoryName: string; recipientName: string; reportNumber: string; reasonClass: string; url: string };

export function reportWithdrawnEmail({ laboratoryName, recipientName, reportNumber, reasonClass, url }: View): Email {
  return composeEmail({
    subject: `Report ${reportNumber} is withdrawn`,
    from: laboratoryName,
    heading: `Report ${reportNumber} is withdrawn`,
    greetingName: recipientName,
    paragraphs: [`We have withdrawn this report because of ${reasonClass}. Do not rely on it, and tell those to whom you gave it. The public register shows it as withdrawn from now on.`, "Please get in touch with us about what happens next."],
    button: { label: "Open your pages", url },
  });
}
