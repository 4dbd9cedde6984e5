import { composeEmail, type Email } from "./compose-email.ts";

export function passwordChangedEmail({ recipientName, changedAt, url }: { recipientName: string; changedAt: string; url: string }): Email {
  return composeEmail({
    subject: "Your password was changed",
    from: "Isogyre",
    heading: "Your password was changed",
    greetingName: recipientName,
    paragraphs: [`The password of your account was changed on ${changedAt}. Every other place where you were signed in has been signed out.`, "If it was not you, choose a new password at once and tell the owner of your laboratory."],
    button: { label: "Choose a new password", url },
  });
}
