import fs from "node:fs";
import { chromium } from "playwright-core";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";
import type { RankingTimes } from "./time-ranking.ts";

const places = [process.env.CHROMIUM_PATH, "/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];
const address = "http://localhost/science";

/** The same bundle in a page of Chromium; null where there is none. Isolated, so that its clock tells microseconds. */
export async function timeInChromium(code: string, table: SpeciesTable, stones: readonly Evidence[]): Promise<RankingTimes | null> {
  const executablePath = places.find((place) => place && fs.existsSync(place));
  if (!executablePath) return null;
  const browser = await chromium.launch({ executablePath, args: ["--no-sandbox"] });
  try {
    const page = await browser.newPage();
    await page.route(address, (route) => route.fulfill({ contentType: "text/html", headers: { "Cross-Origin-Opener-Policy": "same-origin", "Cross-Origin-Embedder-Policy": "require-corp" }, body: "<!doctype html><title>science</title>" }));
    await page.goto(address);
    await page.addScriptTag({ content: code });
    return await page.evaluate(([table, stones]) => (globalThis as unknown as { scienceBench: { timeRanking: (table: unknown, stones: unknown) => RankingTimes } }).scienceBench.timeRanking(table, stones), [table, stones] as const);
  } finally {
    await browser.close();
  }
}
