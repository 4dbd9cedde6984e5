import type { Page } from "playwright-core";

type Instrument = { kind: string; name: string; step: string; highestIndex?: string; check?: { reference: string; value: string; limit: string; shown: string; nextOn: string } };

/** Registers an instrument and, where it can be checked, records a first check. */
export async function addInstrument(page: Page, { labSlug, kind, name, step, highestIndex, check }: Instrument & { labSlug: string }): Promise<void> {
  await page.goto(`/lab/${labSlug}/instruments/new`);
  await page.getByLabel("Kind").selectOption({ label: kind });
  await page.getByLabel("Name", { exact: true }).fill(name);
  if (step) await page.getByLabel("Smallest step read").fill(step);
  if (highestIndex) await page.getByLabel("Highest index").fill(highestIndex);
  await page.getByRole("button", { name: "Register it" }).click();
  await page.getByRole("heading", { level: 1, name }).waitFor();
  if (!check) return;
  await page.getByLabel("Reference").fill(check.reference);
  await page.getByLabel("Its value").fill(check.value);
  await page.getByLabel("Limit ±").fill(check.limit);
  await page.getByLabel("Shown").fill(check.shown);
  await page.getByLabel("Next check").fill(check.nextOn);
  await page.getByRole("button", { name: "Record the check" }).click();
  await page.getByRole("cell", { name: check.reference }).first().waitFor();
}
