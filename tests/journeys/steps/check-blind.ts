import type { Page } from "playwright-core";
import { corundumReadings, recordReadings } from "./record-readings.ts";

/** Another gemmologist begins, reads without having seen anything, compares, and agrees. */
export async function checkBlind(page: Page, { labSlug, stoneCode }: { labSlug: string; stoneCode: string }): Promise<void> {
  await page.goto(`/lab/${labSlug}/stones/${stoneCode}/second-check`);
  await page.getByRole("button", { name: "Begin" }).click();
  await page.getByRole("heading", { name: "New reading" }).waitFor();
  await recordReadings(page, corundumReadings.filter(({ test }) => test === "refractometer" || test === "polariscope" || test === "density"));
  await page.getByLabel("Species, or “not determined”").fill("Corundum");
  await page.getByRole("combobox", { name: "Nature" }).selectOption("synthetic");
  await page.getByRole("button", { name: "Compare" }).click();
  await page.getByRole("heading", { name: "Your decision" }).waitFor();
  await page.getByRole("radio", { name: /agree/i }).first().check();
  await page.getByRole("button", { name: "Decide" }).click();
  await page.getByText("The check agrees with the conclusion.").waitFor();
}
