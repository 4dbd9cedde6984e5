import { readFileSync } from "node:fs";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import type { Browser } from "playwright-core";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, signIn, type Person } from "./steps/a-person.ts";
import { conclude } from "./steps/conclude.ts";
import { letterTo, linkIn } from "./steps/mail.ts";
import { corundumReadings, recordReadings } from "./steps/record-readings.ts";
import { handToBench, takeInStone } from "./steps/take-in-stone.ts";

const { url, mailboxUrl, stripeUrl } = inject("journey");
const labSlug = "marram-quay";
const clientEmail = "t.wray@post.example";

let browser: Browser;
const people: Person[] = [];
const somebody = async () => {
  const person = await aPerson(browser, { url, hasScript: false });
  people.push(person);
  return person.page;
};

beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

test("with JavaScript switched off: take-in, photograph, readings, a strike, conclusion and payment", async () => {
  onTestFailed(() => photographAll(people));
  const [desk, gemmologist, client] = [await somebody(), await somebody(), await somebody()];
  await signIn(desk, { email: "joss@marramquay.example", secret: demonstration.password });

  // What is wrong is said at its field, and what was typed is kept.
  await desk.goto(`/lab/${labSlug}/take-ins/new`);
  await desk.getByLabel("As received").fill("Natural ruby, oval");
  await desk.getByLabel("Weight", { exact: true }).fill("2,14x");
  await desk.getByRole("button", { name: "Take in", exact: true }).last().click();
  expect(await desk.getByLabel("As received").inputValue()).toBe("Natural ruby, oval");
  expect(await desk.getByLabel("Weight", { exact: true }).inputValue()).toBe("2,14x");
  expect(await desk.getByLabel("As received").getAttribute("aria-invalid")).toBe("true");
  expect(await desk.getByLabel("Weight", { exact: true }).getAttribute("aria-invalid")).toBe("true");
  expect(await desk.locator("main").innerText()).toContain("Nothing was taken in yet");

  const { takeInNumber, stoneCode } = await takeInStone(desk, { labSlug, client: "Tamsin Wray", clientEmail, description: "Purplish red transparent oval", weightCt: "2.143", balance: /B1/ });
  const photo = readFileSync(new URL("../../fixtures/demo-photos/purplish-red-oval-8.jpg", import.meta.url));
  await desk.locator("input[type=file]").setInputFiles({ name: "photo.jpg", mimeType: "image/jpeg", buffer: photo });
  await desk.getByRole("button", { name: "Send", exact: true }).click();
  await desk.locator(`img[src*="/photos/"]`).first().waitFor();
  await handToBench(desk, { labSlug, takeInNumber, holder: "Ifeoma Okafor", weightCt: "2.143" });

  await signIn(gemmologist, { email: "ifeoma@marramquay.example", secret: demonstration.password });
  await gemmologist.goto(`/lab/${labSlug}/stones/${stoneCode}`);
  await gemmologist.getByLabel("High edge").fill("1.9x");
  await gemmologist.getByRole("button", { name: "Record" }).click();
  expect(await gemmologist.getByLabel("High edge").inputValue()).toBe("1.9x");
  await recordReadings(gemmologist, [{ test: "refractometer", fields: { "Low edge": "1.790" }, ticks: ["One edge only"] }, ...corundumReadings]);
  await gemmologist.getByRole("row", { name: /1\.790/ }).getByRole("link", { name: "Strike" }).click();
  await gemmologist.getByLabel("Why it is struck").fill("contact liquid edge");
  await gemmologist.getByRole("button", { name: "Strike the reading" }).click();
  expect(await gemmologist.getByRole("row", { name: /1\.790/ }).innerText()).toContain("contact liquid edge");
  const candidates = gemmologist.getByRole("region", { name: "Candidates" });
  expect(await candidates.getByRole("listitem").first().innerText()).toContain("Corundum");
  await conclude(gemmologist, { labSlug, stoneCode });

  await desk.goto(`/lab/${labSlug}/take-ins/${takeInNumber}`);
  await desk.locator(`a[href*="/invoices/"]`).first().click();
  await desk.getByRole("button", { name: "Send the pay link" }).click();
  await client.goto(linkIn(await letterTo(mailboxUrl, { to: clientEmail, subject: /^Invoice/ }), "/pay/"));
  const payUrl = client.url();
  await client.getByRole("button", { name: /^Pay/ }).click();
  await client.waitForURL(`${stripeUrl}/pay/**`);
  await client.getByRole("button", { name: "Pay", exact: true }).click();
  await client.waitForURL(/127\.0\.0\.1:\d+\/pay\//);
  await expect.poll(async () => (await client.goto(payUrl), client.locator("main").innerText()), { timeout: 15_000 }).toContain("Paid on");
});
