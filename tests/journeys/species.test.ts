import fs from "node:fs";
import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, BrowserContext, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, test } from "vitest";
import people from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";

const { url } = inject("journey");
let browser: Browser;
let signedIn: Awaited<ReturnType<BrowserContext["storageState"]>>;
let lab: string;

beforeAll(async () => {
  browser = await openBrowser();
  const context = await browser.newContext();
  const page = await context.newPage();
  await page.goto(`${url}/sign-in`);
  await page.fill("[name=email]", people.people.find(({ role }) => role === "gemmologist")!.email);
  await page.fill("[name=password]", people.password);
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(/\/lab\//);
  lab = new URL(page.url()).pathname.split("/").slice(0, 3).join("/");
  signedIn = await context.storageState();
  await context.close();
});
afterAll(() => browser.close());

async function open(path: string, options: Parameters<Browser["newContext"]>[0] = {}): Promise<Page> {
  const context = await browser.newContext({ storageState: signedIn, viewport: { width: 1440, height: 900 }, ...options });
  const page = await context.newPage();
  page.on("pageerror", (error) => {
    throw error;
  });
  await page.goto(`${url}${lab}${path}`);
  return page;
}
/** Script has taken over when the map answers keys. */
const mapOf = (page: Page) => page.getByRole("application", { name: /^Map of/ });

test("a misleading name typed with a slip leads by keyboard to the true species", async () => {
  const page = await open("/species");
  const box = page.getByRole("combobox", { name: "Any name" });
  await box.fill("evning emerald");
  const option = page.getByRole("option", { name: /Peridot/ });
  await option.waitFor();
  expect(await option.textContent()).toContain("misleading name");
  await box.press("ArrowDown");
  expect(await box.getAttribute("aria-activedescendant")).toBeTruthy();
  await box.press("Enter");
  await page.waitForURL(/\/species\/peridot/);
  await page.waitForFunction(() => document.activeElement?.tagName === "H1");
  expect(await page.getByRole("heading", { level: 1 }).textContent()).toBe("Peridot (olivine)");
  await page.context().close();
});

test("neither the species nor their search is fetched before somebody looks for one", async () => {
  const context = await browser.newContext({ storageState: signedIn });
  const page = await context.newPage();
  const asked: string[] = [];
  page.on("request", (request) => asked.push(request.url()));
  await page.goto(`${url}${lab}/species`, { waitUntil: "networkidle" });
  expect(asked.filter((one) => /species-names\/|search-species|species-table\//.test(one))).toEqual([]);
  await page.getByRole("combobox", { name: "Any name" }).focus();
  await page.waitForResponse(/species-names\//);
  await context.close();
});

test("two ticked species stand side by side, without script too", async () => {
  const page = await open("/species?name=garnet", { javaScriptEnabled: false });
  await page.getByRole("checkbox", { name: "Compare Almandine" }).check();
  await page.getByRole("checkbox", { name: "Compare Pyrope", exact: true }).check();
  await page.getByRole("button", { name: "Compare the ticked" }).click();
  await page.waitForURL(/compare\?species=[a-z-]+,[a-z-]+$/);
  expect(await page.getByRole("columnheader", { name: /Almandine/ }).count()).toBe(1);
  await page.context().close();
});

test("the map is walked by keyboard: species to species, nearer, and into one", async () => {
  const page = await open("/species/map?n=1.718&d=3.60");
  const map = mapOf(page);
  await map.focus();
  await page.keyboard.press("ArrowRight");
  const readout = page.locator("section", { has: map }).locator("[aria-live=polite]");
  const first = await readout.textContent();
  expect(first).toMatch(/index \d\.\d{3}.*density \d\.\d{2}/);
  await page.keyboard.press("ArrowUp");
  await page.waitForFunction((before) => document.querySelector("main [aria-live=polite]")?.textContent !== before, first);
  await page.keyboard.press("+");
  await page.waitForURL(/[?&]x=/);
  const near = page.url();
  await page.keyboard.press("0");
  await page.waitForFunction((before) => location.href !== before, near);
  await page.keyboard.press("Enter");
  await page.waitForURL(/\/species\/[a-z-]+$/);
  await page.goBack();
  await page.getByRole("heading", { level: 1, name: "Index and density map" }).waitFor();
  await page.context().close();
});

test("a pointer over a box says what it is, and dragging moves the map", async () => {
  const page = await open("/species/map");
  const box = (await mapOf(page).locator("rect[data-species=moissanite-synthetic]").boundingBox())!;
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await page.locator("main [aria-live=polite]", { hasText: "Synthetic moissanite" }).waitFor();
  await page.getByRole("link", { name: "Nearer" }).click();
  const diamond = mapOf(page).locator("rect[data-species=diamond]");
  const before = await diamond.getAttribute("x");
  const frame = (await mapOf(page).boundingBox())!;
  await page.mouse.move(frame.x + 300, frame.y + 200);
  await page.mouse.down();
  await page.mouse.move(frame.x + 380, frame.y + 240, { steps: 4 });
  await page.mouse.up();
  await expect.poll(() => diamond.getAttribute("x")).not.toBe(before);
  expect(page.url()).toContain("/species/map");
  await page.context().close();
});

test("from the bench a stone's readings are a link away on the map", async () => {
  const page = await open("/stones");
  const rows = page.locator("tbody tr", { hasText: "On the bench" });
  await rows.filter({ hasText: "purplish red oval" }).getByRole("rowheader").getByRole("link").click();
  await page.getByRole("link", { name: "On the index and density map" }).click();
  await page.waitForURL(/species\/map\?stone=/);
  await page.locator("ellipse[data-reading]").waitFor();
  expect(await page.locator("tbody tr").first().textContent()).toContain("Corundum");
  await page.context().close();
});

const pages = ["/species", "/species?name=zzzzqqqq&indexFrom=x", "/species/corundum", "/species/opal?form=opal-hydrophane", "/species/compare", "/species/compare?species=corundum.ruby,spinel,taaffeite,garnet-almandine", "/species/map", "/species/map?n=1.718&d=3.60"];

test.each([
  { colorScheme: "light", viewport: { width: 1440, height: 900 } },
  { colorScheme: "dark", viewport: { width: 1024, height: 768 } },
] as const)("no page of the species has a fault that can be found by machine, nor scrolls sideways: $colorScheme, $viewport.width wide", async (screen) => {
  for (const path of pages) {
    const page = await open(path, screen);
    const { violations } = await new AxeBuilder({ page }).withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"]).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.slice(0, 3).map(({ html }) => html).join(" ")}`), path).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth), path).toBe(true);
    await page.context().close();
  }
});

test("the open list of found species has no such fault either", async () => {
  const page = await open("/species");
  await page.getByRole("combobox", { name: "Any name" }).fill("gar");
  await page.getByRole("option").first().waitFor();
  await page.keyboard.press("ArrowDown");
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(" ")}`)).toEqual([]);
  await page.context().close();
});

test("the first load of the species pages stays within its bars", async () => {
  const page = await open("/species/map");
  const scripts = await page.evaluate(() => performance.getEntriesByType("resource").filter(({ name }) => /\.js$/.test(name)).map(({ name }) => new URL(name).pathname));
  expect(scripts.length).toBeGreaterThan(3);
  const { gzipSync } = await import("node:zlib");
  const sizes = [...new Set(scripts)].filter((file) => fs.existsSync(`build/client${file}`)).map((file) => ({ file, bytes: gzipSync(fs.readFileSync(`build/client${file}`)).length }));
  expect(sizes.reduce((sum, { bytes }) => sum + bytes, 0)).toBeLessThanOrEqual(141 * 1024);
  for (const { file, bytes } of sizes.filter(({ file }) => /\/(map|linear|list|detail|compare)-/.test(file))) expect(bytes, file).toBeLessThanOrEqual(20 * 1024);
  await page.context().close();
});
