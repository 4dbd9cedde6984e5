import { composeEmail, type Email } from "./compose-email.ts";

export function resetPasswordEmail({ recipientName, url, validMinutes }: { recipientName: string; url: string; validMinutes: number }): Email {
  return composeEmail({
    subject: "Choose a new password",
    from: "Isogyre",
    heading: "Choose a new password",
    greetingName: recipientName,
    paragraphs: ["Somebody asked for a new password for your account. If it was you, choose it here. All places where you are signed in will be signed out."],
    button: { label: "Choose a new password", url },
    footnotes: [`The link works once, for ${validMinutes} minutes. If you did not ask, your password stays as it is.`],
  });
}
