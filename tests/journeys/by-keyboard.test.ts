import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, type Person } from "./steps/a-person.ts";

const { url } = inject("journey");
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** What has the focus, by its label or its words. */
const focused = (page: Page) =>
  page.evaluate(() => {
    const at = document.activeElement as HTMLInputElement | null;
    return [at?.labels?.[0]?.textContent, at?.getAttribute("aria-label"), at?.textContent].find((words) => words?.trim())?.trim() ?? "";
  });

/** Tab until it is reached; a page that traps the focus, or has too long a way, fails. */
async function tabTo(page: Page, name: RegExp, { most = 60 } = {}): Promise<void> {
  for (let presses = 0; presses < most; presses++) {
    if (name.test(await focused(page))) return;
    await page.keyboard.press("Tab");
  }
  throw new Error(`${name} is not reached by ${most} presses of Tab; the focus is on “${await focused(page)}”`);
}

test("by keyboard alone: sign in, find the stone, record readings of three kinds, strike one", async () => {
  const person: Person = await aPerson(browser, { url });
  onTestFailed(() => photographAll([person]));
  const { page, complaints } = person;
  await page.goto("/sign-in");
  await tabTo(page, /^E-mail address/);
  await page.keyboard.type("ifeoma@marramquay.example");
  await page.keyboard.press("Tab");
  await page.keyboard.type(demonstration.password);
  await page.keyboard.press("Enter");
  await page.waitForURL("**/lab/marram-quay/stones");
  await page.waitForLoadState("networkidle"); // keys alone are the script's, and act once it is there

  await page.keyboard.press("/");
  await page.keyboard.type("yellow oval");
  await page.keyboard.press("Enter");
  await page.waitForURL(/q=yellow/);
  await tabTo(page, /^MQ-26-0017 · 1$/);
  // What has the focus shows it.
  expect(await page.evaluate(() => getComputedStyle(document.activeElement!).outlineStyle)).not.toBe("none");
  await page.keyboard.press("Enter");
  await page.waitForURL(/stones\/MQ-26-0017-1/);
  const rows = page.getByRole("table", { name: "Readings, latest first" }).getByRole("row");
  const before = await rows.count();

  await page.getByRole("heading", { name: "New reading" }).waitFor();
  await page.keyboard.press("7");
  await page.waitForURL(/test=weight/);
  await tabTo(page, /^Weight, ct/);
  await page.keyboard.type("2,471");
  await page.keyboard.press("Enter");
  await rows.nth(before).waitFor();

  await page.keyboard.press("Escape"); // out of the field, so that digits choose a test again
  await page.keyboard.press("2");
  await page.waitForURL(/test=spot/);
  await tabTo(page, /^Spot, n/);
  await page.keyboard.type("1.76");
  await page.keyboard.press("Enter");
  await rows.nth(before + 1).waitFor();

  await tabTo(page, /^Strike reading/, { most: 80 });
  await page.keyboard.press("Enter");
  await page.waitForURL(/\/strike$/);
  await tabTo(page, /^Why it is struck/);
  await page.keyboard.type("the spot ran out to the girdle");
  await tabTo(page, /^Strike the reading$/);
  await page.keyboard.press("Enter");
  await page.waitForURL(/stones\/MQ-26-0017-1/);
  await page.getByText("the spot ran out to the girdle").waitFor();
  expect(complaints).toEqual([]);
});
