import type { Page } from "playwright-core";

const tests = { refractometer: "Refractometer", polariscope: "Polariscope", density: "Density", weight: "Weight", dimensions: "Dimensions", free: "Observation" } as const;
type Reading = { test: keyof typeof tests; fields: Record<string, string>; choices?: Record<string, string>; ticks?: string[]; note?: string };

/** What a purplish red corundum of 2.143 ct shows. */
export const corundumReadings: readonly Reading[] = [
  { test: "weight", fields: { Weight: "2.143" } },
  { test: "dimensions", fields: { Length: "8.41", Width: "6.90", Depth: "4.52" } },
  { test: "refractometer", fields: { "Low edge": "1,762", "High edge": "1,770" }, ticks: ["Extremes of a full rotation"] },
  { test: "polariscope", fields: { "Directions tried": "3" }, choices: { "In a full turn": "blinks", "Interference figure": "uniaxial", Sign: "-" } },
  { test: "density", fields: { "In air": "2.143", "In water": "1.608", Water: "21.4" } },
  { test: "free", fields: { "What was seen": "Curved striae and gas bubbles under 40×" } },
];

/** On a bench that is open. Every reading is recorded by its own form and seen in the table of readings. */
export async function recordReadings(page: Page, readings: readonly Reading[]): Promise<void> {
  for (const { test, fields, choices = {}, ticks = [] } of readings) {
    await page.getByRole("navigation", { name: "Test" }).getByRole("link", { name: new RegExp(`^${tests[test]}`) }).click();
    const form = page.locator("form").filter({ has: page.locator(`input[name=kind][value=${test}]`) });
    for (const [label, value] of Object.entries(fields)) await form.getByLabel(new RegExp(`^${label}`)).first().fill(value);
    for (const [label, value] of Object.entries(choices)) await form.getByLabel(new RegExp(`^${label}`)).first().selectOption(value);
    for (const label of ticks) await form.getByLabel(label).check();
    const rows = page.getByRole("region", { name: /Readings|Your readings/ }).getByRole("row");
    const before = await rows.count();
    await form.getByRole("button", { name: "Record" }).click();
    await rows.nth(before === 0 ? 1 : before).waitFor();
  }
}
