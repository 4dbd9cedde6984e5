import { composeEmail, type Email } from "./compose-email.ts";

export function accountExistsEmail({ recipientName, resetUrl, validMinutes }: { recipientName: string; resetUrl: string; validMinutes: number }): Email {
  return composeEmail({
    subject: "You already have an account",
    from: "Isogyre",
    heading: "You already have an account",
    greetingName: recipientName,
    paragraphs: ["Somebody wanted to open an account with this address, and there is one already. Nothing was changed. If it was you, sign in with it; you can open a further laboratory from there.", "If you have forgotten the password, choose a new one here."],
    button: { label: "Choose a new password", url: resetUrl },
    footnotes: [`The link works once, for ${validMinutes} minutes. If it was not you, leave this letter as it is.`],
  });
}
