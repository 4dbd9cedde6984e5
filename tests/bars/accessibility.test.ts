import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, inject, test } from "vitest";
import demonstration from "../../scripts/demo-people.json" with { type: "json" };
import { openBrowser } from "../setup/browser.ts";
import { aPerson, signIn } from "../journeys/steps/a-person.ts";
import { people, rows, type PersonKey } from "./world.ts";

const { url } = inject("journey");
const lab = "/lab/marram-quay";
let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

const pages: ReadonlyArray<{ as: PersonKey | null; widthsPx: readonly number[]; paths: readonly string[] }> = [
  { as: null, widthsPx: [1280, 360], paths: ["/", "/sign-in", "/sign-up", "/forgot-password", "/check", "/v", "/v/0000000000000000", "/no-such-page"] },
  { as: "client", widthsPx: [360], paths: ["/my", "/account"] },
  { as: "owner", widthsPx: [1280, 768], paths: [`${lab}/stones`, `${lab}/stones?q=nothing-like-it`, `${lab}/clients`, `${lab}/instruments`, `${lab}/instruments/new`, `${lab}/instruments/recall`, `${lab}/instruments/references`, `${lab}/invoices`, `${lab}/invoices/MQ-I-26-00008`, `${lab}/reports`, `${lab}/reports/MQ-R-26-00005`, `${lab}/take-ins/new`, `${lab}/take-ins/MQ-T-26-0008`, `${lab}/take-ins/MQ-T-26-0008/receipt`, `${lab}/take-ins/MQ-T-26-0008/labels`, `${lab}/settings`, `${lab}/settings/team`, `${lab}/settings/prices`] },
  { as: "gemmologist", widthsPx: [1280, 1024], paths: [`${lab}/stones/MQ-26-0015-1`, `${lab}/stones/MQ-26-0015-1?test=density`, `${lab}/stones/MQ-26-0015-1?test=rotation`, `${lab}/stones/MQ-26-0015-1?test=magnification`, `${lab}/stones/MQ-26-0013-1?test=spectroscope`, `${lab}/stones/MQ-26-0013-1/spectra`, `${lab}/stones/MQ-26-0013-1/inclusions`, `${lab}/stones/MQ-26-0015-1/readings/1/strike`, `${lab}/stones/MQ-26-0012-1/conclusion`, `${lab}/stones/MQ-26-0016-1/conclusion`, `${lab}/stones/MQ-26-0008-1/second-check`, `${lab}/stones/MQ-26-0009-1/report`, `${lab}/species`, `${lab}/species/corundum`, `${lab}/species/compare?species=corundum,spinel`, `${lab}/species/map?stone=MQ-26-0015-1`, `${lab}/parcels`, `${lab}/parcels/new`] },
  { as: "appraiser", widthsPx: [1280], paths: [`${lab}/stones/MQ-26-0008-1/valuation`] },
];

// The dim room has the same elements in other colours: there, colours alone are asked for.
const rounds = pages.flatMap(({ as, widthsPx, paths }) => [
  ...widthsPx.map((widthPx) => ({ as: as ?? "nobody", who: as, room: "light" as const, widthPx, paths })),
  { as: as ?? "nobody", who: as, room: "dim" as const, widthPx: widthsPx[0]!, paths },
]);

test.each(rounds)(
  "no barrier that axe finds, and nothing wider than the window: as $as, $room room, $widthPx px",
  async ({ who, room, widthPx, paths }) => {
    const { page } = await aPerson(browser, { url, widthPx });
    await page.context().addCookies([{ name: "room", value: room, url }]);
    if (who) await signIn(page, { email: people[who], secret: demonstration.password });
    const registered = who === null ? (await rows<{ code: string }>("select code from reports where state in ('issued', 'withdrawn', 'superseded') limit 4")).map(({ code }) => `/v/${code}`) : [];
    const found: string[] = [];
    for (const path of [...paths, ...registered]) found.push(...(await barriersOn(page, path, { isColourOnly: room === "dim" })));
    await page.context().close();
    expect(found).toEqual([]);
  },
);

async function barriersOn(page: Page, path: string, { isColourOnly }: { isColourOnly: boolean }): Promise<string[]> {
  await page.goto(path);
  const axe = new AxeBuilder({ page }).exclude("iframe");
  const { violations } = await (isColourOnly ? axe.withRules(["color-contrast"]) : axe.withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"])).analyze();
  const excess = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  return [...violations.map(({ id, impact, nodes }) => `${path}: ${id} (${impact}) ${nodes[0]!.html.slice(0, 160)} ×${nodes.length}`), ...(excess > 0 ? [`${path}: ${excess} px wider than the window`] : [])];
}
