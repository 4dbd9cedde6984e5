import type { Page } from "playwright-core";
import { letterTo, linkIn } from "./mail.ts";
import { password } from "./a-person.ts";

export type NewLaboratory = { name: string; slug: string; prefix: string; ownerName: string; ownerEmail: string; isSolePractice: boolean };

/** From the sign-up form by the letter to the open laboratory's settings. */
export async function openLaboratory(page: Page, { mailboxUrl, ...laboratory }: NewLaboratory & { mailboxUrl: string }): Promise<void> {
  await page.goto("/sign-up");
  await page.getByLabel("Your name").fill(laboratory.ownerName);
  await page.getByLabel("E-mail address").fill(laboratory.ownerEmail);
  await page.getByLabel("Password", { exact: true }).fill(password);
  await page.getByLabel("Name of the laboratory").fill(laboratory.name);
  await page.getByRole("radio", { name: laboratory.isSolePractice ? /^I alone/ : /^Several people/ }).check();
  await page.getByLabel("Short name").fill(laboratory.slug);
  await page.getByLabel("Letters of your numbers").fill(laboratory.prefix);
  await page.getByLabel("Time zone").selectOption("Europe/Lisbon");
  await page.getByLabel("Currency of fees").selectOption("EUR");
  await page.getByRole("button", { name: "Send me the link" }).click();
  await page.waitForURL("**/sign-up/sent");
  const letter = await letterTo(mailboxUrl, { to: laboratory.ownerEmail, subject: /confirm/i });
  await page.goto(linkIn(letter, "/confirm-email/"));
  await page.getByRole("button", { name: "Confirm and open the laboratory" }).click();
  await page.waitForURL(`**/lab/${laboratory.slug}/settings`);
}
