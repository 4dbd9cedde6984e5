import type { Page } from "playwright-core";

type Value = { labSlug: string; stoneCode: string; effectiveOn: string; prices: readonly string[]; amount: string };

/** A small comparison of asking prices, certified and signed. */
export async function valueStone(page: Page, { labSlug, stoneCode, effectiveOn, prices, amount }: Value): Promise<void> {
  await page.goto(`/lab/${labSlug}/stones/${stoneCode}/valuation`);
  await page.getByLabel("Purpose").fill("Insurance scheduling");
  await page.getByLabel("Intended use", { exact: true }).fill("Scheduling on the owner's policy");
  await page.getByLabel("Intended users").fill("The client and their insurer");
  await page.getByLabel("Value type").selectOption({ index: 1 });
  await page.getByLabel("Definition, in full").fill("What a new item of like kind costs at retail, in reasonable time.");
  await page.getByLabel("Source of the definition").fill("The insurer's wording");
  await page.getByLabel("Market level").selectOption({ index: 1 });
  await page.getByLabel("Market place").fill("Port Ellery");
  await page.getByLabel("Effective date").fill(effectiveOn);
  await page.getByLabel("Inspected on").fill(effectiveOn);
  await page.getByLabel("Inspection", { exact: true }).fill("In hand, loose, by the appraiser");
  for (const [at, price] of prices.entries()) {
    const row = page.getByRole("group", { name: `Comparable ${at + 1}` });
    if ((await row.count()) === 0) await page.getByRole("button", { name: "Add a comparable" }).click();
    await row.getByLabel("Kind").selectOption({ index: 1 });
    await row.getByLabel("Reference").fill(`Shop window ${at + 1}`);
    await row.getByLabel("Description").fill("Synthetic ruby, oval, like size");
    await row.getByLabel("Date", { exact: true }).fill(effectiveOn);
    await row.getByLabel("Price").fill(price);
    await row.getByLabel("Exchange rate").fill("1");
    await row.getByLabel("Adjusted by").fill("1");
  }
  await page.getByRole("textbox", { name: "Value (optional)", exact: true }).fill(amount);
  await page.getByLabel("How the comparables lead to the value").fill("The middle of the asking prices, alike in size and kind.");
  await page.getByLabel("Why cost and income were not applied").fill("Retail replacement is asked for; neither bears on it.");
  await page.getByLabel("Limiting conditions").fill("Valid for the purpose and date stated only.");
  for (const box of await page.getByRole("group", { name: "I certify that" }).getByRole("checkbox").all()) await box.check();
  await page.getByRole("button", { name: "Save and sign" }).click();
  await page.getByText(/Signed/).first().waitFor();
}
