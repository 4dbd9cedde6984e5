import { composeEmail, type Email } from "./compose-email.ts";

export function inviteClientEmail({ laboratoryName, recipientName, url, validDays }: { laboratoryName: string; recipientName: string; url: string; validDays: number }): Email {
  return composeEmail({
    subject: `Your pages at ${laboratoryName}`,
    from: laboratoryName,
    heading: "Follow your items and fetch your reports",
    greetingName: recipientName,
    paragraphs: [`${laboratoryName} has opened pages of your own for you: what you handed over, how far it has come, invoices, and your reports as soon as they are issued.`],
    button: { label: "Open your pages", url },
    footnotes: [`The link works once, for ${validDays} days. Afterwards you sign in with the password that you choose.`],
  });
}
