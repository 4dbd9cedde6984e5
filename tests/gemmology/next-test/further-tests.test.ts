import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { benchTestIds, type BenchTestId } from "#app/gemmology/next-test/bench-test.ts";
import { nextTests, type Setting } from "#app/gemmology/next-test/next-tests.ts";

const { table } = loadSpeciesTable();
const setting = (more: Partial<Setting> = {}): Setting => ({ massCt: 3, uAirCt: 0.0015, uWaterCt: 0.004, isPolished: true, offered: new Set(benchTestIds), done: new Set(), poor: new Set(), barred: new Map(), ...more });
const even = (...ids: string[]) => ids.map((speciesId) => ({ speciesId, probability: 1 / ids.length }));
const bitsOf = (test: BenchTestId, ids: readonly string[], more: Partial<Setting> = {}) => nextTests(even(...ids), table, setting(more)).recommended.find(({ testId }) => testId === test)?.bits ?? 0;

test("the spectroscope is worth most where the species have spectra of their own", () => {
  expect(bitsOf("spectroscope", ["garnet-almandine", "spinel"])).toBeGreaterThan(0.3);
  expect(bitsOf("spectroscope", ["topaz", "danburite"])).toBe(0);
});

test("the magnet tells iron's garnets from corundum, a little, and nothing of two without iron", () => {
  expect(bitsOf("magnet", ["garnet-almandine", "corundum"])).toBeGreaterThan(0.05);
  expect(bitsOf("magnet", ["topaz", "quartz"])).toBe(0);
});

test("ways above the limit are named only where the refractometer could not reach", () => {
  const ids = ["diamond", "cubic-zirconia"];
  expect(bitsOf("brewster", ids, { isOverLimit: true })).toBeGreaterThan(0.8);
  expect(bitsOf("depth", ids, { isOverLimit: true })).toBeGreaterThan(0.8);
  expect(bitsOf("brewster", ids)).toBe(0);
});

// Quartz on a general facet and its biaxial twin (rotation examples, facet 1): β = 1.5443 or 1.5504.
test("an undecided rotation run asks for the polariser before a second facet, where β tells the species apart", () => {
  const undecided = [1.5443, 1.5504].map((beta) => ({ indices: { alpha: 1.5443, beta, gamma: 1.5534 }, u: 0.0006 }));
  const { recommended } = nextTests(even("quartz", "iolite"), table, setting({ undecided, offered: new Set<BenchTestId>(["polariser", "secondFacet"]) }));
  expect(recommended.map(({ testId }) => testId)).toEqual(["polariser", "secondFacet"]);
  expect(recommended[0]!.settles).toMatch(/^tells quartz from iolite/);
  expect(bitsOf("polariser", ["quartz", "iolite"])).toBe(0);
  // Both crystals speak alike of two species that are uniaxial of one sign.
  expect(bitsOf("polariser", ["quartz", "scheelite"], { undecided: undecided.slice(0, 1) })).toBe(0);
});

test("a poor reading may be repeated, and is told as that", () => {
  const { recommended } = nextTests(even("topaz", "tourmaline"), table, setting({ poor: new Set<BenchTestId>(["density"]) }));
  expect(recommended.find(({ testId }) => testId === "density")).toMatchObject({ isRepeat: true });
});
