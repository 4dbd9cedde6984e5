import { readFileSync } from "node:fs";
import { afterAll, beforeAll, expect, inject, onTestFailed, test } from "vitest";
import type { Browser } from "playwright-core";
import { openBrowser } from "../setup/browser.ts";
import { aPerson, photographAll, type Person } from "./steps/a-person.ts";
import { addInstrument } from "./steps/add-instrument.ts";
import { checkBlind } from "./steps/check-blind.ts";
import { conclude } from "./steps/conclude.ts";
import { inviteColleague } from "./steps/invite-colleague.ts";
import { letterTo, linkIn } from "./steps/mail.ts";
import { openLaboratory } from "./steps/open-laboratory.ts";
import { readQr } from "./steps/read-qr.ts";
import { corundumReadings, recordReadings } from "./steps/record-readings.ts";
import { handToBench, takeInStone } from "./steps/take-in-stone.ts";
import { valueStone } from "./steps/value-stone.ts";

const { url, mailboxUrl, stripeUrl } = inject("journey");
const labSlug = "ebb-and-flow";
const clientEmail = "n.quill@post.example";
const inDays = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

let browser: Browser;
const people: Person[] = [];
const somebody = async (options: Partial<Parameters<typeof aPerson>[1]> = {}) => {
  const person = await aPerson(browser, { url, ...options });
  people.push(person);
  return person.page;
};

beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

test("from a laboratory's sign-up to a stranger who verifies its report by the QR code on the page", async () => {
  onTestFailed(() => photographAll(people));
  const owner = await somebody();
  await openLaboratory(owner, { mailboxUrl, name: "Ebb & Flow Gem Laboratory", slug: labSlug, prefix: "EF", ownerName: "Orla Venn", ownerEmail: "orla@ebbandflow.example", isSolePractice: false });
  const colleagues = { gemmologist: await somebody(), checker: await somebody(), appraiser: await somebody() };
  await inviteColleague(owner, colleagues.gemmologist, { labSlug, mailboxUrl, name: "Petra Holt", email: "petra@ebbandflow.example", title: "Gemmologist", role: "Gemmologist" });
  await inviteColleague(owner, colleagues.checker, { labSlug, mailboxUrl, name: "Sami Rook", email: "sami@ebbandflow.example", title: "Gemmologist", role: "Gemmologist" });
  await inviteColleague(owner, colleagues.appraiser, { labSlug, mailboxUrl, name: "Vera Lunt", email: "vera@ebbandflow.example", title: "Appraiser", role: "Appraiser" });

  const nextOn = inDays(7);
  await addInstrument(owner, { labSlug, kind: "Balance", name: "B1", step: "0.001", check: { reference: "check weight 5 ct", value: "5.000", limit: "0.003", shown: "5.000", nextOn } });
  await addInstrument(owner, { labSlug, kind: "Refractometer", name: "R1", step: "0.001", highestIndex: "1.81", check: { reference: "quartz, ordinary ray", value: "1.544", limit: "0.002", shown: "1.544", nextOn } });
  await addInstrument(owner, { labSlug, kind: "Polariscope", name: "P1", step: "" });
  await addInstrument(owner, { labSlug, kind: "Gauge", name: "G1", step: "0.01" });

  // The desk: here the owner, who also holds that role.
  const goods = { client: "Nils Quill", clientEmail, description: "Purplish red transparent oval", weightCt: "2.143" };
  const { takeInNumber, stoneCode } = await takeInStone(owner, { labSlug, ...goods, balance: /B1/, declared: "900", isValuationWanted: true });
  const photo = new URL("../../fixtures/demo-photos/purplish-red-oval-8.jpg", import.meta.url);
  await owner.locator("input[type=file]").setInputFiles({ name: "IMG_0417.jpg", mimeType: "image/jpeg", buffer: readFileSync(photo) });
  await owner.getByRole("button", { name: "Send", exact: true }).click();
  await owner.locator(`img[src*="/photos/"]`).first().waitFor();
  await handToBench(owner, { labSlug, takeInNumber, holder: "Petra Holt", weightCt: "2.143" });

  // The bench. Candidates follow the digits before anything is saved.
  const { gemmologist, checker, appraiser } = colleagues;
  await gemmologist.goto(`/lab/${labSlug}/stones/${stoneCode}`);
  await gemmologist.getByLabel("Low edge").fill("1.762");
  await gemmologist.getByLabel("High edge").fill("1.770");
  const candidates = gemmologist.getByRole("region", { name: "Candidates" });
  await candidates.getByText("with what you type").waitFor();
  expect(await candidates.getByRole("listitem").first().innerText()).toContain("Corundum");
  await gemmologist.reload();
  await recordReadings(gemmologist, corundumReadings);
  expect(await candidates.getByRole("listitem").first().innerText()).toContain("Corundum");
  await conclude(gemmologist, { labSlug, stoneCode });

  // The second check sees neither the first readings, nor the candidates, nor the conclusion.
  await checker.goto(`/lab/${labSlug}/stones/${stoneCode}/second-check`);
  expect(await checker.locator("main").innerText()).not.toMatch(/corundum|1\.762/i);
  await checkBlind(checker, { labSlug, stoneCode });

  // The valuation, by somebody who sees neither the declared value nor the fee.
  await appraiser.goto(`/lab/${labSlug}/stones/${stoneCode}/valuation`);
  expect(await appraiser.locator("main").innerText()).not.toMatch(/900/);
  await valueStone(appraiser, { labSlug, stoneCode, effectiveOn: inDays(0), prices: ["640", "700", "760"], amount: "700" });

  // Authorised, yet held until it is paid.
  await appraiser.goto(`/lab/${labSlug}/stones/${stoneCode}/report`);
  await appraiser.getByLabel("I have read the draft").check();
  await appraiser.getByRole("button", { name: "Authorise and freeze" }).click();
  await appraiser.waitForURL(/\/reports\/EF-R-\d\d-00001$/);
  const reportUrl = appraiser.url();
  const issue = appraiser.getByRole("button", { name: "Issue the report" });
  await expect.poll(async () => (await appraiser.reload(), issue.isEnabled()), { timeout: 20_000 }).toBe(true);
  await issue.click();
  await appraiser.getByText("The fee for this report is not paid yet.").waitFor();

  // The pay link, a declined card, then one that is taken.
  await owner.goto(`/lab/${labSlug}/invoices`);
  await owner.getByRole("link", { name: /EF-I-/ }).first().click();
  await owner.getByRole("button", { name: "Send the pay link" }).click();
  const payUrl = linkIn(await letterTo(mailboxUrl, { to: clientEmail, subject: /^Invoice/ }), "/pay/");
  const client = await somebody({ widthPx: 390, heightPx: 800 });
  await client.goto(payUrl);
  await client.getByRole("button", { name: /^Pay/ }).click();
  await client.waitForURL(`${stripeUrl}/pay/**`);
  await client.getByRole("button", { name: "Try a card that is declined" }).click();
  await client.getByText("The card was declined").waitFor();
  await client.getByRole("button", { name: "Go back without paying" }).click();
  await client.getByText("The payment was not completed").waitFor();
  await appraiser.reload();
  expect(await appraiser.locator("main").innerText()).toContain("Not yet");
  await client.getByRole("button", { name: /^Pay/ }).click();
  await client.waitForURL(`${stripeUrl}/pay/**`);
  await client.getByRole("button", { name: "Pay", exact: true }).click();
  await client.waitForURL(/\/pay\//);
  await expect.poll(async () => (await client.goto(payUrl), client.locator("main").innerText()), { timeout: 15_000 }).toContain("Paid on");
  await letterTo(mailboxUrl, { to: clientEmail, subject: /^Receipt for invoice/ });

  // Every event once more, newest first: nothing is paid, issued or written twice.
  const ready = await letterTo(mailboxUrl, { to: clientEmail, subject: /^Report .* is ready/ });
  const control = await somebody();
  await control.goto(stripeUrl);
  await control.getByRole("button", { name: "Send the last ten again, newest first" }).click();
  await control.getByRole("heading", { name: "Events" }).waitFor();
  const letters = (await (await fetch(`${mailboxUrl}/messages.json?to=${clientEmail}`)).json()) as { subject: string }[];
  expect(letters.filter(({ subject }) => /^Receipt for invoice/.test(subject))).toHaveLength(1);
  expect(letters.filter(({ subject }) => /is ready/.test(subject))).toHaveLength(1);

  // The laboratory's copy of the PDF, and what a telephone reads on its page.
  await appraiser.goto(reportUrl);
  await appraiser.getByText("Issued", { exact: true }).first().waitFor();
  const pdf = await (await appraiser.request.get(`${reportUrl}/file.pdf`)).body();
  const onPage = await readQr(pdf);
  expect(onPage).toMatch(new RegExp(`^${url}/v/`));
  expect(ready.text).toContain("EF-R-");

  // A stranger, without script, on a telephone.
  const stranger = await somebody({ hasScript: false, widthPx: 390, heightPx: 800 });
  const scripts: string[] = [];
  stranger.on("request", (request) => request.resourceType() === "script" && scripts.push(request.url()));
  await stranger.goto(onPage!);
  const said = await stranger.locator("body").innerText();
  expect(said).toMatch(/genuine/i);
  expect(said).toMatch(/2\.143/);
  expect(said).toMatch(/8\.41/);
  expect(said).toMatch(/synthetic/i);
  expect(said).not.toMatch(/Quill|700|900/);
  expect(scripts).toEqual([]);
  await stranger.goto(`/v/${"0".repeat(16)}`);
  expect(await stranger.locator("body").innerText()).toMatch(/no report|unknown|not in the register/i);

  // The file itself, compared in the browser.
  const holder = await somebody();
  await holder.goto("/check");
  const code = new URL(onPage!).pathname.split("/").at(-1)!;
  await holder.getByLabel("Code on the report").fill(code.toLowerCase());
  await holder.getByLabel("The PDF").setInputFiles({ name: "report.pdf", mimeType: "application/pdf", buffer: pdf });
  const sent: string[] = [];
  holder.on("request", (request) => request.method() !== "GET" && sent.push(request.url()));
  await holder.getByRole("button", { name: "Compare" }).click();
  await holder.getByText(/very file|is the file|same file|matches/i).first().waitFor();
  const altered = Buffer.from(pdf);
  altered[altered.length >> 1]! ^= 1;
  await holder.getByLabel("The PDF").setInputFiles({ name: "report.pdf", mimeType: "application/pdf", buffer: altered });
  await holder.getByRole("button", { name: "Compare" }).click();
  await holder.getByText(/not the file|differs|altered|does not match|another file/i).first().waitFor();
  expect(sent).toEqual([]);

  expect(people.flatMap(({ complaints }) => complaints)).toEqual([]);
}, 180_000);
