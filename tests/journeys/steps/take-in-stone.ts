import type { Page } from "playwright-core";

type Goods = { client: string; clientEmail: string; description: string; weightCt: string; balance: RegExp; declared?: string; isValuationWanted?: boolean };

/** The desk's form, for a client who is new. Returns the take-in's number and the stone's code as its address has it. */
export async function takeInStone(page: Page, { labSlug, ...goods }: Goods & { labSlug: string }): Promise<{ takeInNumber: string; stoneCode: string }> {
  await page.goto(`/lab/${labSlug}/take-ins/new`);
  await page.getByLabel("Client", { exact: true }).fill(goods.client);
  await page.getByRole("button", { name: "Find", exact: true }).click();
  await page.getByLabel("A new client with the name above").check();
  await page.locator("#new-client-email").fill(goods.clientEmail);
  await page.getByLabel("Handed over by").fill(goods.client);
  await page.getByLabel("As received").fill(goods.description);
  await page.getByLabel("Weight", { exact: true }).fill(goods.weightCt);
  const balance = page.getByLabel("Balance");
  await balance.selectOption((await balance.locator("option", { hasText: goods.balance }).getAttribute("value"))!);
  if (goods.declared) await page.getByLabel("Declared value").fill(goods.declared);
  await page.getByLabel("Condition").fill("none seen with 10×");
  for (const consent of ["Contact liquid on a facet", "Weighing in water", "Photographs for the report", "Public register page"]) await page.getByRole("checkbox", { name: consent }).check();
  if (goods.isValuationWanted) await page.getByLabel("A valuation is wanted too").check();
  await page.getByLabel("The client agrees to this fee").check();
  await page.getByRole("button", { name: "Take in", exact: true }).last().click();
  await page.waitForURL(/\/take-ins\/[A-Z]+-T-\d\d-\d+$/);
  const takeInNumber = page.url().split("/").at(-1)!;
  const href = await page.locator(`a[href*="/lab/${labSlug}/stones/"]`).first().getAttribute("href");
  return { takeInNumber, stoneCode: href!.split("/").at(-1)! };
}

/** Out of the safe, weighed, to somebody's bench. */
export async function handToBench(page: Page, { labSlug, takeInNumber, holder, weightCt }: { labSlug: string; takeInNumber: string; holder: string; weightCt: string }): Promise<void> {
  await page.goto(`/lab/${labSlug}/take-ins/${takeInNumber}`);
  await page.getByText("Hand it over").click();
  const form = page.locator("form").filter({ has: page.getByLabel("What happens") });
  await form.getByLabel("What happens").selectOption({ label: "To the bench" });
  await form.getByLabel("Where to").fill("Bench 1");
  await form.getByLabel("Who has it").selectOption({ label: holder });
  await form.getByLabel("Weight", { exact: false }).fill(weightCt);
  await form.getByRole("button").last().click();
  await page.getByRole("cell", { name: new RegExp(`${holder}, Bench 1`) }).first().waitFor();
}
