import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { rows } from "../bars/world.ts";
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn, type Person } from "./steps/a-person.ts";

const { url } = inject("journey");
const lab = "/lab/marram-quay";
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

async function gemmologist(options: { hasScript?: boolean; widthPx?: number } = {}): Promise<Person> {
  const person = await aPerson(browser, { url, ...options });
  onTestFailed(() => photographAll([person]));
  await signIn(person.page, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  return person;
}

/** Seven beryls and a glass, with a slip in the second row's index. */
const table = ["Mark\tWeight\tRI low\tRI high\tSG\tColour", ...["1.577\t1.583\t2.72", "1,57o\t1,583\t2,71", "1.578\t1.584\t2.73", "1.577\t1.582\t2.72", "1.520\t\t2.50", "1.578\t1.583\t2.71", "1.576\t1.582\t2.72", "1.577\t1.583\t2.73"].map((figures, at) => `${at + 1}\t0.${110 + at}\t${figures}\tgreen`)].join("\n");

async function paste(page: Page, text: string): Promise<void> {
  await page.getByLabel("From a spreadsheet").focus();
  await page.evaluate((pasted) => {
    const data = new DataTransfer();
    data.setData("text/plain", pasted);
    document.activeElement!.dispatchEvent(new ClipboardEvent("paste", { clipboardData: data, bubbles: true, cancelable: true }));
  }, text);
}

test("from a take-in's item: a table is pasted, mended by keyboard, ranked, saved, and a row becomes a stone", async () => {
  const { page, complaints } = await gemmologist();
  const [item] = await rows<{ number: string; takeIn: string }>("select i.number, t.number takeIn from items i join take_ins t on t.laboratory_id = i.laboratory_id and t.id = i.take_in_id where i.description = 'Three green ovals in one paper'");
  await page.goto(`${lab}/take-ins/${item!.takeIn}`);
  await page.getByRole("link", { name: "Read its 3 stones as a parcel" }).click();
  await page.getByRole("link", { name: "Enter a parcel" }).first().click();
  await page.waitForURL(/parcels\/new/);
  await page.waitForLoadState("networkidle");
  expect(await page.getByLabel("Item").inputValue()).toBe(item!.number);
  await page.getByLabel("Name").fill("Green ovals");
  await paste(page, table);
  await page.getByText("1 cell cannot be read").waitFor();
  const slip = page.getByLabel("Row 2, Index, low edge or only");
  expect(await slip.inputValue()).toBe("1,57o");
  expect(await slip.getAttribute("aria-invalid")).toBe("true");
  const { violations } = await new AxeBuilder({ page }).withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"]).analyze();
  expect(violations.map(({ id, nodes }) => `${id} ${nodes[0]!.html.slice(0, 160)}`)).toEqual([]);

  // From the cell above it, down by Enter, and the slip typed over.
  await page.getByLabel("Row 1, Index, low edge or only").focus();
  await page.keyboard.press("Enter");
  await page.keyboard.type("1,577");
  await page.getByText("1 cell cannot be read").waitFor({ state: "detached" });
  await page.getByText("Stand apart: row 5.").waitFor();
  await page.getByText("Beryl", { exact: true }).first().waitFor();
  await page.getByRole("button", { name: "Save the parcel" }).click();
  await page.waitForURL(/parcels\/[a-z0-9]{26}$/);

  await page.getByText(/^Row 5$/).first().waitFor();
  await page.getByRole("button", { name: "Make row 2 a stone" }).click();
  await page.getByText("Choose the instrument that showed it").first().waitFor();
  for (const [label, name] of [["Weighed on", /^B1/], ["Indices read on", /^R2/]] as const) {
    const select = page.getByLabel(label);
    await select.selectOption((await select.locator("option", { hasText: name }).getAttribute("value"))!);
  }
  await page.getByRole("button", { name: "Make row 2 a stone" }).click();
  await page.waitForURL(new RegExp(`stones/${item!.number}-2$`));
  const readings = page.getByRole("table", { name: "Readings, latest first" });
  await readings.getByText("1.577 – 1.583").waitFor();
  await readings.getByText("Parcel “Green ovals”, row 2, mark 2").first().waitFor();
  expect(complaints).toEqual([]);
  await page.context().close();
});

test("without script and on a narrow screen: pasted, read, refused at its cell with what was typed, mended, saved", async () => {
  const { page, complaints } = await gemmologist({ hasScript: false, widthPx: 390 });
  await page.goto(`${lab}/parcels/new`);
  await page.getByLabel("Name").fill("Green ovals again");
  await page.getByLabel("From a spreadsheet").fill(table);
  await page.getByRole("button", { name: "Read the table" }).click();
  await page.getByRole("button", { name: "Save the parcel" }).click();
  const slip = page.getByLabel("Row 2, Index, low edge or only");
  expect(await slip.inputValue()).toBe("1,57o");
  await page.getByText("Write digits: for example 1.762.").first().waitFor();
  expect(await page.getByLabel("Name").inputValue()).toBe("Green ovals again");
  await slip.fill("1,577");
  await page.getByRole("button", { name: "Save the parcel" }).click();
  await page.getByRole("heading", { level: 1, name: "Green ovals again" }).waitFor();
  await page.getByText("Mostly").waitFor();
  await page.getByText("Stand apart: row 5.").waitFor();
  expect(await page.evaluate("document.documentElement.scrollWidth - document.documentElement.clientWidth")).toBeLessThanOrEqual(0);
  expect(complaints).toEqual([]);
  await page.context().close();
});
