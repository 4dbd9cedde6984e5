import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn, type Person } from "./steps/a-person.ts";

const { url } = inject("journey");
const stone = "/lab/marram-quay/stones/MQ-26-0013-1";
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
const typedLines = (page: Page) => page.getByRole("textbox", { name: /^Lines and bands/ });

/** A table that an instrument may write: per cent of light, decimal commas. */
const table = Buffer.from(
  `nm;%T\r\n${Array.from({ length: 401 }, (_, at) => {
    const nm = 380 + at;
    const absorbance = 0.15 + 0.7 * Math.exp(-(((nm - 550) / 35) ** 2)) + 0.4 * Math.exp(-(((nm - 668) / 2) ** 2));
    return `${nm};${(100 * 10 ** -absorbance).toFixed(3).replace(".", ",")}`;
  }).join("\r\n")}`,
);

test("a spectrum is drawn by pointing and by keys, and what is drawn is what is typed", async () => {
  const { page, complaints } = await aGemmologist();
  await page.goto(`${stone}?test=spectroscope`);
  const pad = page.getByRole("slider", { name: "Place on the spectrum" });
  await typedLines(page).fill("653 weak");
  await page.getByRole("button", { name: "line at 653 nm, weak" }).waitFor();

  // Red lies left: 700 to 400 nm over the width.
  await pad.scrollIntoViewIfNeeded();
  const { x, y, width } = (await pad.boundingBox())!;
  const at = (nm: number) => x + ((700 - nm) / 300) * width;
  await page.mouse.click(at(500), y + 30);
  expect(await typedLines(page).inputValue()).toMatch(/^653 weak, (499|500|501)$/);
  await page.mouse.move(at(600), y + 30);
  await page.mouse.down();
  await page.mouse.move(at(560), y + 30, { steps: 6 });
  await page.mouse.up();
  expect(await typedLines(page).inputValue()).toMatch(/, (559|560|561)-(599|600|601)$/);
  await page.getByRole("button", { name: "Strong", exact: true }).click();
  expect(await typedLines(page).inputValue()).toMatch(/56\d?-?.* strong/);

  // By keys alone: a faint line ten nanometres on, and away again.
  await typedLines(page).fill("");
  await pad.focus();
  await page.keyboard.press("Home");
  await page.keyboard.press("Shift+ArrowRight");
  await page.keyboard.press("Enter");
  await page.keyboard.press("f");
  expect(await typedLines(page).inputValue()).toBe("690 faint");
  expect(await pad.getAttribute("aria-valuetext")).toBe("690 nm, line at 690 nm, faint");
  for (const key of ["ArrowRight", "b", "Shift+ArrowRight", "b"]) await page.keyboard.press(key);
  expect(await typedLines(page).inputValue()).toBe("690 faint, 679-689");
  // Letters on the spectrum choose no other test.
  expect(page.url()).toContain("test=spectroscope");
  await page.keyboard.press("Delete");
  expect(await typedLines(page).inputValue()).toBe("690 faint");

  // The other way round stays so for this browser.
  await page.getByRole("button", { name: "Violet left" }).click();
  await page.reload();
  expect(await page.getByRole("button", { name: "Violet left" }).getAttribute("aria-pressed")).toBe("true");
  await page.getByRole("button", { name: "Red left" }).click();
  expect(complaints).toEqual([]);
});

test("a measured spectrum is attached, a bad file refused with its line, its peaks taken into a reading, and withdrawn", async () => {
  const { page, complaints } = await aGemmologist({ widthPx: 390, heightPx: 844 });
  await page.goto(`${stone}/spectra`);
  await page.getByLabel("File of the spectrum").setInputFiles({ name: "bad.csv", mimeType: "text/csv", buffer: Buffer.from("400;1\n401;2\n402;none\n403;1") });
  await page.getByLabel("What was measured").fill("through the pavilion");
  await page.getByRole("button", { name: "Attach", exact: true }).click();
  await page.getByText("Line 3: “none” is no number.").waitFor();
  expect(await page.getByLabel("What was measured").inputValue()).toBe("through the pavilion");

  await page.getByLabel("File of the spectrum").setInputFiles({ name: "table.csv", mimeType: "text/csv", buffer: table });
  await page.getByRole("button", { name: "Attach", exact: true }).click();
  await page.getByText("Spectrum 2 is kept, with 2 peaks to look at.").waitFor();
  const axe = await new AxeBuilder({ page }).include("main").analyze();
  expect(axe.violations.map(({ id, nodes }) => [id, nodes[0]?.html])).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);

  const peaks = page.getByRole("table", { name: "Peaks of spectrum 2" });
  for (const box of await peaks.getByRole("checkbox").all()) await box.check();
  await page.locator("#spectrum-2").getByRole("button", { name: "Take what is ticked into a reading" }).click();
  await page.waitForURL(/test=spectroscope/);
  expect(await typedLines(page).inputValue()).toMatch(/^52\d(\.\d)?-57\d(\.\d)?, 668$/);
  await page.getByLabel("Instrument's spread").selectOption("digital");
  await page.getByRole("button", { name: "Record", exact: true }).click();
  await page.getByText(/^Reading \d+ is recorded/).waitFor();
  // What was taken is recorded: the form begins empty again.
  expect(await typedLines(page).inputValue()).toBe("");

  await page.goto(`${stone}/spectra`);
  await page.locator("#spectrum-2").getByText("Withdraw this spectrum").click();
  await page.locator("#spectrum-2").getByLabel("Why it does not belong to this stone").fill("of another stone");
  await page.locator("#spectrum-2").getByRole("button", { name: "Withdraw", exact: true }).click();
  await page.getByText(/^Withdrawn .*: of another stone$/).waitFor();
  const file = await page.request.get(`${stone}/spectra/2/file`);
  expect(file.headers()["content-disposition"]).toContain("attachment");
  expect(Buffer.compare(await file.body(), table)).toBe(0);
  expect(complaints).toEqual([]);
});

test("without script a spectrum is attached, looked at and taken into a reading as well", async () => {
  const { page } = await aGemmologist({ hasScript: false });
  await page.goto(`${stone}/spectra`);
  await page.getByLabel("The drawn spectrum of the bench").selectOption("violet-prism");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  expect(page.url()).toContain("/spectra");
  expect(await page.getByLabel("The drawn spectrum of the bench").inputValue()).toBe("violet-prism");
  await page.getByLabel("File of the spectrum").setInputFiles({ name: "table.csv", mimeType: "text/csv", buffer: table });
  await page.getByRole("button", { name: "Attach", exact: true }).click();
  await page.getByText(/Spectrum \d+ is kept/).waitFor();
  const newest = page.locator("[id^=spectrum-]").first();
  await newest.getByRole("checkbox").last().check();
  await newest.getByRole("button", { name: "Take what is ticked into a reading" }).click();
  await page.waitForURL(/line=668/);
  expect(await typedLines(page).inputValue()).toBe("668");
  await page.getByLabel("Instrument's spread").selectOption("digital");
  await page.getByRole("button", { name: "Record", exact: true }).click();
  await page.getByText(/^Reading \d+ is recorded/).waitFor();
});
