import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { chromium, type BrowserContext, type Page } from "playwright-core";
import { afterAll, expect, inject, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { browserOptions } from "../setup/browser.ts";
import { signIn } from "./steps/a-person.ts";

const { url } = inject("journey");
const profile = fs.mkdtempSync(path.join(os.tmpdir(), "isogyre-profile-"));
afterAll(() => fs.rmSync(profile, { recursive: true, force: true }));

/** A browser that keeps what it stores when it is closed, as one on a tablet does. */
const openTablet = (): Promise<BrowserContext> => chromium.launchPersistentContext(profile, { ...browserOptions(), baseURL: url, viewport: { width: 1280, height: 900 }, reducedMotion: "reduce" });
const stone = "/lab/marram-quay/stones/MQ-26-0018-1";
const waiting = (page: Page) => page.getByRole("region", { name: "Waiting on this device" }).getByRole("listitem");
const kept = (page: Page) => page.getByRole("table", { name: "Readings, latest first" }).getByRole("row");

async function weigh(page: Page, weightCt: string): Promise<void> {
  await page.getByRole("navigation", { name: "Test" }).getByRole("link", { name: /^Weight/ }).click();
  await page.waitForURL(/test=weight/);
  const field = page.getByLabel(/^Weight, ct/);
  await field.fill(weightCt);
  await field.press("Enter");
}

test("readings and a strike made without the line wait on the device, through a reload and a closed browser, and arrive once and in order", async () => {
  let tablet = await openTablet();
  let page = tablet.pages()[0] ?? (await tablet.newPage());
  page.setDefaultTimeout(15_000);
  await signIn(page, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  await page.goto(stone);
  // The page is kept once its worker has it.
  await page.waitForFunction(async () => {
    if (!navigator.serviceWorker.controller) return false;
    const pages = await caches.open("bench-pages-1");
    return (await pages.keys()).some(({ url: address }) => address.endsWith(location.pathname));
  });
  await page.waitForLoadState("networkidle");

  await tablet.setOffline(true);
  await weigh(page, "3.901");
  await waiting(page).nth(0).getByText("3.901 ct").waitFor();
  // What is no weight is refused here as there, and what was typed is kept.
  await weigh(page, "heavy");
  await page.getByText("Write the weight as it is shown").waitFor();
  expect(await page.getByLabel(/^Weight, ct/).inputValue()).toBe("heavy");
  await weigh(page, "3.902");
  await waiting(page).nth(1).getByText("3.902 ct").waitFor();
  // The second was a slip: struck before it was ever sent.
  await waiting(page).nth(1).getByText("Strike", { exact: true }).click();
  await waiting(page).nth(1).getByLabel("Why it is struck").fill("the stone was wet");
  await waiting(page).nth(1).getByRole("button", { name: "Strike it" }).click();
  await waiting(page).nth(2).getByText("the stone was wet").waitFor();

  await page.reload();
  await waiting(page).nth(2).waitFor();
  await weigh(page, "3.903");
  await waiting(page).nth(3).getByText("3.903 ct").waitFor();

  // A page that was never open here says which are.
  await page.goto("/lab/marram-quay/reports");
  await page.getByRole("heading", { name: "No line" }).waitFor();
  await page.getByRole("link", { name: "MQ-26-0018-1" }).waitFor();

  await tablet.close();
  tablet = await openTablet();
  page = tablet.pages()[0] ?? (await tablet.newPage());
  page.setDefaultTimeout(20_000);
  await tablet.setOffline(true);
  await page.goto(stone);
  await waiting(page).nth(3).waitFor();
  expect(await waiting(page).count()).toBe(4);

  await tablet.setOffline(false);
  await kept(page).nth(3).waitFor();
  await page.getByRole("region", { name: "Waiting on this device" }).waitFor({ state: "detached" });
  const rows = (await kept(page).allInnerTexts()).slice(1).map((text) => text.replace(/\s+/g, " "));
  expect(rows.map((row) => /3\.90\d/.exec(row)?.[0])).toEqual(["3.903", "3.902", "3.901"]);
  expect(rows[1]).toContain("the stone was wet");
  await page.reload();
  expect((await kept(page).count()) - 1).toBe(3);
  await tablet.close();
}, 120_000);

test("what the server will not have is shown with its reason, and stays until a person leaves it out", async () => {
  const tablet = await openTablet();
  const page = tablet.pages()[0] ?? (await tablet.newPage());
  page.setDefaultTimeout(20_000);
  await page.goto(stone);
  await page.waitForLoadState("networkidle");
  await tablet.setOffline(true);
  // The client of this stone did not agree to heavy liquids; without the line the device cannot know.
  await page.getByText("Seldom made: over the limit, and last").click();
  await page.getByRole("link", { name: /^Heavy liquid/ }).click();
  await page.waitForURL(/test=heavyLiquid/);
  await page.getByLabel(/^The stone/).selectOption("floats");
  await page.getByLabel(/^Liquid's density/).fill("3.32");
  await page.getByRole("button", { name: "Record" }).click();
  await waiting(page).nth(0).getByText("Floats").waitFor();
  await tablet.setOffline(false);
  await waiting(page).nth(0).getByText(/The client has not agreed to heavy liquids/).waitFor();
  await waiting(page).nth(0).getByRole("button", { name: "Leave it out" }).click();
  await waiting(page).nth(0).waitFor({ state: "detached" });
  await tablet.close();
}, 60_000);
