import { composeEmail, type Email } from "./compose-email.ts";

export function inviteStaffEmail({ laboratoryName, invitedByName, recipientName, roleNames, url, validDays }: { laboratoryName: string; invitedByName: string; recipientName: string; roleNames: readonly string[]; url: string; validDays: number }): Email {
  return composeEmail({
    subject: `${laboratoryName} invites you`,
    from: laboratoryName,
    heading: "An invitation to work with us",
    greetingName: recipientName,
    paragraphs: [`${invitedByName} invites you to ${laboratoryName} on Isogyre, as: ${roleNames.join(", ")}.`],
    button: { label: "Accept the invitation", url },
    footnotes: [`The link works once, for ${validDays} days. If you do not know the laboratory, leave this letter as it is.`],
  });
}
