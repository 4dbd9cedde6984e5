import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn } from "./steps/a-person.ts";

const { url } = inject("journey");
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** Presses of keys, with the digits of measured values counted apart. */
function aKeyboard(page: Page) {
  let [presses, digits] = [0, 0];
  return {
    press: async (...keys: string[]) => {
      for (const key of keys) {
        await page.keyboard.press(key);
        presses += 1;
      }
    },
    digits: async (text: string) => {
      await page.keyboard.type(text);
      digits += text.length;
    },
    words: async (text: string) => {
      await page.keyboard.type(text);
      presses += text.length;
    },
    counted: () => ({ presses, digits }),
  };
}

test("ten readings of four kinds, a strike, candidates and a conclusion in under 90 presses beside the digits", async () => {
  const person = await aPerson(browser, { url });
  onTestFailed(() => photographAll([person]));
  const { page, complaints } = person;
  await signIn(page, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  await page.goto("/lab/marram-quay/stones/MQ-26-0020-1");
  await page.waitForLoadState("networkidle");
  const keys = aKeyboard(page);
  const rows = page.getByRole("table", { name: "Readings, latest first" }).getByRole("row");
  let kept = await page.getByRole("table", { name: "Readings, latest first" }).count() > 0 ? (await rows.count()) - 1 : 0;
  const recorded = async () => {
    kept += 1;
    await rows.nth(kept).waitFor();
    await page.waitForFunction(() => document.activeElement === document.body);
  };
  const open = async (key: string, test: string) => {
    await keys.press(key);
    await page.waitForURL(new RegExp(`test=${test}`));
    await page.waitForFunction(() => document.activeElement?.matches("form input, form select"));
  };

  for (const weight of ["4.021", "4.020", "4.021"]) {
    await open("7", "weight");
    await keys.digits(weight);
    await keys.press("Enter");
    await recorded();
  }
  for (const [low, high] of [["1746", "1755"], ["1746", "1754"], ["1747", "1755"]] as const) {
    await open("1", "refractometer");
    await keys.digits(low);
    await keys.press("Space");
    await keys.digits(high);
    await keys.press("Enter");
    await recorded();
  }
  for (const inWater of ["2.944", "2.943"]) {
    await open("6", "density");
    await keys.digits("4.021");
    await keys.press("Enter");
    await keys.digits(inWater);
    await keys.press("Enter");
    await keys.digits("21.4");
    await keys.press("Enter");
    await recorded();
  }
  for (let time = 0; time < 2; time++) {
    await open("5", "polariscope");
    await keys.press("l", "Enter"); // Light and dark four times in a turn
    await keys.digits("3");
    await keys.press("Enter", "Enter"); // no figure was sought, so no sign
    await recorded();
  }

  // The candidates are there without a key.
  const candidates = page.getByRole("region", { name: "Candidates" });
  await candidates.getByRole("heading", { name: "Chrysoberyl" }).waitFor();

  await keys.press("x");
  await page.waitForURL(/\/strike$/);
  await page.waitForFunction(() => document.activeElement?.matches("textarea"));
  await keys.words("tilted");
  await keys.press("Control+Enter");
  await page.getByText("tilted").waitFor();
  await page.waitForURL(/stones\/MQ-26-0020-1$/);
  await page.waitForFunction(() => document.activeElement === document.body || document.activeElement?.matches("h1, h2, main"));

  await keys.press("c");
  await page.waitForURL(/\/conclusion$/);
  await page.waitForFunction(() => document.activeElement?.matches("input[name=speciesName]"));
  await keys.words("chrysoberyl");
  await keys.press("Enter", "Enter"); // no variety
  await keys.press("c", "Enter"); // consistent with
  await keys.words("not"); // not determined
  await keys.press("Enter");
  await keys.press("Enter"); // treatments are left open
  await keys.words("corundum");
  await keys.press("Enter");
  await keys.words("uniaxial");
  await keys.press("Enter", "Enter");
  await page.getByText(/^Concluded\./).waitFor();

  const { presses, digits } = keys.counted();
  console.info(`${presses} presses beside ${digits} digits`);
  expect(presses).toBeLessThan(90);
  expect(complaints).toEqual([]);
});

test("by touch at a bench tablet: readings, a strike and the candidates, every target as large as a gloved finger", async () => {
  const context = await browser.newContext({ baseURL: url, viewport: { width: 1024, height: 768 }, hasTouch: true, isMobile: true, reducedMotion: "reduce" });
  const page = await context.newPage();
  page.setDefaultTimeout(15_000);
  await signIn(page, { email: "mattias@marramquay.example", secret: demonstration.password });
  await page.goto("/lab/marram-quay/stones/MQ-26-0023-1");
  await page.waitForLoadState("networkidle");
  await page.getByRole("link", { name: /^Spot reading/ }).tap();
  await page.waitForURL(/test=spot/);
  await page.getByLabel(/^Spot, n/).fill("1.54");
  await page.getByRole("button", { name: "Record" }).tap();
  const rows = page.getByRole("table", { name: "Readings, latest first" }).getByRole("row");
  await rows.nth(1).waitFor();
  await page.getByRole("link", { name: /^Colour filter/ }).tap();
  await page.waitForURL(/test=colourFilter/);
  await page.getByLabel(/^Through the filter/).selectOption("red");
  await page.getByLabel(/^Light/).selectOption("incandescent");
  await page.getByRole("button", { name: "Record" }).tap();
  await rows.nth(2).waitFor();
  await page.getByRole("region", { name: "Candidates" }).getByRole("heading", { level: 3 }).first().waitFor();

  // Nothing to be tapped in the form of a reading is smaller than 44 px in its smaller side.
  const small = await page.evaluate(() => {
    const card = [...document.querySelectorAll("section, div")].find((one) => one.querySelector(":scope h2")?.textContent === "New reading")!;
    return [...card.querySelectorAll<HTMLElement>("nav[aria-label=Test] a, form select, form button, form input:not([type=hidden]):not([type=radio]):not([type=checkbox]), form label:has(input)")]
      .filter((target) => target.offsetParent !== null)
      .map((target) => ({ what: target.textContent?.slice(0, 40) ?? target.tagName, height: target.getBoundingClientRect().height }))
      .filter(({ height }) => height < 43.5);
  });
  expect(small).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);

  await page.getByRole("link", { name: /^Strike reading 1$/ }).tap();
  await page.getByLabel("Why it is struck").fill("dome is scratched");
  await page.getByRole("button", { name: "Strike the reading" }).tap();
  await page.getByText("dome is scratched").waitFor();
  await context.close();
});
