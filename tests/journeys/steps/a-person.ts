import type { Browser, Page } from "playwright-core";

export const password = "a long walk to the lighthouse";

/** Somebody at a browser of their own. Whatever their page complains of is kept in `complaints`. */
export async function aPerson(browser: Browser, { url, hasScript = true, widthPx = 1440, heightPx = 1000 }: { url: string; hasScript?: boolean; widthPx?: number; heightPx?: number }) {
  const context = await browser.newContext({ baseURL: url, javaScriptEnabled: hasScript, viewport: { width: widthPx, height: heightPx }, reducedMotion: "reduce" });
  const page = await context.newPage();
  page.setDefaultTimeout(15_000);
  const complaints: string[] = [];
  page.on("pageerror", (error) => complaints.push(`${page.url()}: ${error.message}`));
  page.on("console", (message) => {
    // A refused form answers with 4xx, and Chromium says so; that is no fault of the page.
    if (message.type() === "error" && !/status of 4\d\d/.test(message.text())) complaints.push(`${page.url()}: ${message.text()}`);
  });
  return { page, complaints };
}
export type Person = Awaited<ReturnType<typeof aPerson>>;

export async function signIn(page: Page, { email, secret = password }: { email: string; secret?: string }): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(secret);
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL((to) => !to.pathname.startsWith("/sign-in"));
}

/** What everybody had before them when a journey failed. */
export async function photographAll(people: readonly Person[]): Promise<void> {
  for (const [at, { page }] of people.entries()) if (page.url() !== "about:blank") await page.screenshot({ path: `.test/failed-${at + 1}.png`, fullPage: true });
}
