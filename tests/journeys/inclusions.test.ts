import { readFileSync } from "node:fs";
import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn, type Person } from "./steps/a-person.ts";

const { url } = inject("journey");
const page13 = "/lab/marram-quay/stones/MQ-26-0013-1/inclusions";
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

async function aGemmologist(options: Partial<Parameters<typeof aPerson>[1]> = {}): Promise<Person> {
  const person = await aPerson(browser, { url, ...options });
  onTestFailed(() => photographAll([person]));
  await signIn(person.page, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  return person;
}
const outline = (page: Page) => page.getByRole("application", { name: /^Outline/ });
const photograph = (page: Page) => page.getByRole("application", { name: /^Photograph/ });
const rows = (page: Page) => page.getByRole("table", { name: "Inclusions" }).getByRole("row");

test("on a telephone an inclusion is placed by a tap and by arrow keys, kept, struck, and read in a list", async () => {
  const { page } = await aGemmologist({ widthPx: 390, heightPx: 844 });
  await page.goto(page13);
  const before = await rows(page).count();
  await outline(page).scrollIntoViewIfNeeded();
  const { x, y, width, height } = (await outline(page).boundingBox())!;
  await page.mouse.click(x + width * 0.9, y + height * 0.5);
  expect(Number(await page.getByLabel("From the left").inputValue())).toBeCloseTo(90, 0);

  // The photograph by keys alone; Enter goes on to the form.
  await photograph(page).focus();
  for (const key of ["ArrowLeft", "Shift+ArrowLeft", "ArrowLeft", "ArrowUp", "Enter"]) await page.keyboard.press(key);
  expect([await page.getByLabel("From its left").inputValue(), await page.getByLabel("From its top").inputValue()]).toEqual(["44", "49"]);
  expect(await page.evaluate(() => document.activeElement?.id)).toBe("inclusion-type");

  // What is missing is said at its field, and the places stay.
  await page.getByLabel("Size").fill("0,3x");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  await page.getByText("Choose what it is.").waitFor();
  await page.getByText("Write it in digits: for example 0.12.").waitFor();
  expect(Number(await page.getByLabel("From the left").inputValue())).toBeCloseTo(90, 0);
  await page.getByLabel("What it is").selectOption("needle");
  await page.getByLabel("Size").fill("0,3");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  await page.getByText(/^Inclusion \d+ is kept\.$/).waitFor();
  expect(await rows(page).count()).toBe(before + 1);
  expect(await rows(page).last().innerText()).toMatch(/Needle.*3 o'clock, at the girdle; photograph 1, middle.*0\.3 mm/s);
  expect(await page.getByLabel("From the left").inputValue()).toBe("");

  const axe = await new AxeBuilder({ page }).include("main").analyze();
  expect(axe.violations.map(({ id, nodes }) => [id, nodes[0]?.html])).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);

  const last = rows(page).last();
  await last.getByText(/^Strike no\./).click();
  await last.getByLabel("Why it is struck").fill("a hair on the lens");
  await last.getByRole("button", { name: "Strike", exact: true }).click();
  await page.getByText(/^Struck .*: a hair on the lens$/).waitFor();
});

test("a photograph through the microscope is added with its magnification and shows a scale bar; the outline is chosen", async () => {
  const { page } = await aGemmologist();
  await page.goto(page13);
  await page.getByLabel("Photograph of this stone").setInputFiles({ name: "through-40.jpg", mimeType: "image/jpeg", buffer: readFileSync(new URL("../../fixtures/demo-photos/green-oval-9.jpg", import.meta.url)) });
  await page.getByLabel("Magnification").first().fill("40");
  await page.getByLabel("Picture's width").first().fill("4,2");
  await page.getByRole("button", { name: "Add the photograph" }).click();
  await page.getByText("The photograph is kept.").waitFor();
  await page.getByRole("img", { name: "Scale bar of 1 mm" }).waitFor();
  expect(await page.locator("main").innerText()).toContain("40×, 4.2 mm across");
  await page.getByLabel("Drawn as").selectOption("cushion");
  await page.getByRole("button", { name: "Draw it" }).click();
  await page.getByText("what was placed keeps its place").waitFor();
  expect(await page.getByLabel("Drawn as").inputValue()).toBe("cushion");
});

test("without script a place is typed in per cent", async () => {
  const { page } = await aGemmologist({ hasScript: false });
  await page.goto(`${page13}?side=pavilion`);
  await page.getByLabel("What it is").selectOption("other");
  await page.getByLabel("In words").fill("a small fly");
  await page.getByLabel("From the left").fill("50");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  await page.getByText("A place on the outline needs both numbers.").waitFor();
  expect([await page.getByLabel("From the left").inputValue(), await page.getByLabel("In words").inputValue()]).toEqual(["50", "a small fly"]);
  await page.getByLabel("From the top").fill("98,5");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  await page.getByText(/^Inclusion \d+ is kept\.$/).waitFor();
  expect(await rows(page).last().innerText()).toMatch(/a small fly.*6 o'clock, at the girdle, pavilion up/s);
});
