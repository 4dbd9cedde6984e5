import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn } from "./steps/a-person.ts";

const { url } = inject("journey");
const lab = "/lab/marram-quay";
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

test.each([true, false])("a reading called back is marked at its bench, answered for with a reason, and found among what was done (script: %s)", async (hasScript) => {
  const person = await aPerson(browser, { url, hasScript });
  onTestFailed(() => photographAll([person]));
  const { page, complaints } = person;
  await signIn(page, { email: "mattias@marramquay.example", secret: demonstration.password });
  await page.goto(`${lab}/instruments`);
  await page.getByText("R3 failed a check").waitFor();
  await page.getByRole("link", { name: "recall list", exact: true }).click();
  await page.getByRole("heading", { level: 1, name: "Recall list" }).waitFor();
  const first = page.getByRole("table").getByRole("row").nth(1);
  const stone = (await first.getByRole("rowheader").textContent())!;
  await first.getByRole("link", { name: stone }).click();
  await page.getByText("Out of check: R3 failed its check with quartz, ordinary ray").first().waitFor();

  await page.goto(`${lab}/instruments/recall`);
  await page.getByRole("checkbox", { name: new RegExp(`of ${stone}`) }).first().check();
  await page.getByLabel("Accepted with a reason").check();
  await page.getByRole("button", { name: "Record it" }).click();
  await page.getByText("Say why these readings can stand").waitFor();
  expect(await page.getByRole("checkbox", { name: new RegExp(`of ${stone}`) }).first().isChecked()).toBe(true);
  await page.getByRole("textbox", { name: "Reason" }).fill("A spot to 0.01 is not moved by what the scale was off.");
  await page.getByRole("button", { name: "Record it" }).click();
  await page.getByText("One reading is answered for.").waitFor();
  expect(await page.getByRole("checkbox", { name: new RegExp(`of ${stone}`) }).count()).toBe(0);
  await page.getByRole("link", { name: "Done" }).click();
  await page.getByRole("row", { name: new RegExp(stone) }).getByText("Mattias Lindqvist").first().waitFor();
  expect(complaints).toEqual([]);
  await page.context().close();
});
