import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, inject, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, signIn } from "./steps/a-person.ts";
import { recordReadings } from "./steps/record-readings.ts";

const { url } = inject("journey");
const bench = "/lab/marram-quay/stones/MQ-26-0014-1";
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

test("a colleague's reading appears within seconds without a reload, and what is being typed stays", async () => {
  const [one, other] = [await aPerson(browser, { url }), await aPerson(browser, { url })];
  await signIn(one.page, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  await signIn(other.page, { email: "mattias@marramquay.example", secret: demonstration.password });
  await one.page.goto(bench);
  await one.page.getByLabel("Low edge").fill("1.7");
  await one.page.evaluate(() => void ((globalThis as { isSamePage?: boolean }).isSamePage = true));

  await other.page.goto(bench);
  await recordReadings(other.page, [{ test: "free", fields: { "What was seen": "A feather at the girdle, nine o'clock" } }]);

  await one.page.getByRole("cell", { name: /A feather at the girdle/ }).waitFor({ timeout: 8_000 });
  expect(await one.page.getByLabel("Low edge").inputValue()).toBe("1.7");
  expect(await one.page.evaluate(() => (globalThis as { isSamePage?: boolean }).isSamePage)).toBe(true);

  // On paper, every reading and its day.
  await one.page.goto(`${bench}/sheet`);
  await one.page.emulateMedia({ media: "print" });
  expect(await one.page.locator("article").innerText()).toContain("A feather at the girdle");
  expect(await one.page.getByRole("button", { name: "Print" }).isVisible()).toBe(false);
  expect([...one.complaints, ...other.complaints]).toEqual([]);
});
