import type { Page } from "playwright-core";
import { letterTo, linkIn } from "./mail.ts";
import { password } from "./a-person.ts";

type Colleague = { name: string; email: string; title: string; role: "Owner" | "Gemmologist" | "Appraiser" | "Desk" };

/** The owner invites; the colleague follows the letter and sets a password. */
export async function inviteColleague(owner: Page, colleague: Page, { labSlug, mailboxUrl, name, email, title, role }: Colleague & { labSlug: string; mailboxUrl: string }): Promise<void> {
  await owner.goto(`/lab/${labSlug}/settings/team`);
  const form = owner.getByRole("region", { name: "Invite somebody" });
  await form.getByLabel("Name", { exact: true }).fill(name);
  await form.getByLabel("E-mail address").fill(email);
  await form.getByLabel("Title below a signature").fill(title);
  await form.getByRole("checkbox", { name: new RegExp(`^${role}`) }).check();
  await form.getByRole("button", { name: "Send the invitation" }).click();
  await owner.getByText(email).first().waitFor();

  const letter = await letterTo(mailboxUrl, { to: email, subject: /invit/i });
  await colleague.goto(linkIn(letter, "/invitation/"));
  await colleague.getByLabel("Password", { exact: true }).fill(password);
  await colleague.getByRole("button", { name: "Accept the invitation" }).click();
  await colleague.waitForURL(`**/lab/${labSlug}/**`);
}
