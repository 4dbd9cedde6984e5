import { composeEmail, type Email } from "./compose-email.ts";

export function confirmEmailEmail({ recipientName, url, validHours }: { recipientName: string; url: string; validHours: number }): Email {
  return composeEmail({
    subject: "Confirm your e-mail address",
    from: "Isogyre",
    heading: "Confirm your e-mail address",
    greetingName: recipientName,
    paragraphs: ["You opened an account with this address. Confirm that it is yours, so that we can reach you about it."],
    button: { label: "Confirm the address", url },
    footnotes: [`The link works once, for ${validHours} hours. If you did not open an account, leave this letter as it is: nothing happens without the link.`],
  });
}
