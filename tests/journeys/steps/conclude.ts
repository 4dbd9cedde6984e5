import type { Page } from "playwright-core";

/** A synthetic corundum, as its readings and its inclusions say. */
export async function conclude(page: Page, { labSlug, stoneCode }: { labSlug: string; stoneCode: string }): Promise<void> {
  await page.goto(`/lab/${labSlug}/stones/${stoneCode}/conclusion`);
  await page.getByLabel("Species or material").fill("Corundum");
  await page.getByLabel("Variety").fill("ruby");
  await page.getByLabel("How sure").selectOption("identified");
  await page.getByRole("combobox", { name: "Nature" }).selectOption("synthetic");
  await page.getByLabel("What shows it").fill("Curved striae and gas bubbles");
  await page.getByLabel("Heating: finding").selectOption("notDeterminable");
  await page.getByLabel("What the conclusion rests on").fill("Index, optic character, density, curved striae");
  await page.getByLabel("Alternative 1", { exact: true }).fill("Spinel");
  await page.getByLabel("Alternative 1: why it is ruled out").fill("singly refractive");
  await page.getByLabel("Outline").fill("oval");
  await page.getByRole("textbox", { name: "Colour (optional)", exact: true }).fill("purplish red");
  await page.getByRole("button", { name: "Conclude" }).click();
  await page.getByText(/Concluded|Synthetic ruby|Synthetic corundum/i).first().waitFor();
}
