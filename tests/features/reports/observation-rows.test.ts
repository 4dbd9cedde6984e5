import { expect, test } from "vitest";
import type { ReadingDetail, ReadingValueName } from "#app/domain/reading.ts";
import { indicesLine, observationRows, type ReportedReading } from "#app/features/reports/observation-rows.ts";

function reading(detail: ReadingDetail, values: Partial<Record<ReadingValueName, [value: number, u: number | null, typed?: string]>> = {}, quality: ReportedReading["quality"] = "good"): ReportedReading {
  return {
    detail,
    quality,
    noResultReason: quality === "noResult" ? "poor polish" : "",
    values: new Map(Object.entries(values).map(([name, [value, standardUncertainty, typedText = String(value)]]) => [name as ReadingValueName, { value, standardUncertainty, typedText }])),
  };
}
const edges = reading({ kind: "refractometer", edges: "two", isRotated: true, facet: "table", light: "sodium" }, { low: [1.762, 0.0015], high: [1.77, 0.0015], birefringence: [0.008, 0.0012] });
const figure = (sign: "+" | "-" | null) => reading({ kind: "polariscope", behaviour: "blinks", directionsTried: 3, figure: "uniaxial", sign });
const texts = (rows: ReturnType<typeof observationRows>) => Object.fromEntries(rows.map(({ label, parts }) => [label, parts.map(({ text }) => text).join(" ")]));

test("a uniaxial negative stone's edges are named ω and ε", () => {
  expect(texts(observationRows([edges, figure("-")]))).toMatchObject({
    "Refractive index": "nω 1.770(2) nε 1.762(2) table, Na 589.3 nm",
    Birefringence: "0.008(1)",
    "Optic character": "Uniaxial negative",
  });
});

test("a positive stone's are named the other way round", () => {
  expect(texts(observationRows([edges, figure("+")]))["Refractive index"]).toMatch(/^nω 1\.762\(2\) nε 1\.770\(2\)/);
});

test("without a sign the edges stay low and high", () => {
  expect(texts(observationRows([edges, figure(null)]))["Refractive index"]).toMatch(/^1\.762\(2\) – 1\.770\(2\)/);
});

test("edges at one position say so", () => {
  const unrotated = reading({ kind: "refractometer", edges: "two", isRotated: false, facet: "table", light: "white" }, { low: [1.762, 0.003], high: [1.77, 0.003] });
  expect(texts(observationRows([unrotated]))["Refractive index"]).toContain("one position only");
});

test("over the limit is told as a bound", () => {
  expect(texts(observationRows([reading({ kind: "overLimit", facet: "table", light: "sodium" }, { limit: [1.81, null] })]))["Refractive index"]).toBe("n > 1.81 over the limit of the refractometer");
});

test("density carries its uncertainty and the water's temperature as typed", () => {
  expect(texts(observationRows([reading({ kind: "density", method: "suspended" }, { sg: [3.997, 0.021], tempC: [21.4, null, "21,4"] })]))["Specific gravity"]).toBe("4.00(2) hydrostatic, 21.4 °C");
});

test("a good reading is told before a later poor one", () => {
  const poor = reading({ kind: "spot", method: "50/50", facet: "dome", light: "white" }, { n: [1.5, 0.02, "1.50"] }, "poor");
  const good = reading({ kind: "spot", method: "50/50", facet: "dome", light: "white" }, { n: [1.54, 0.008, "1.54"] });
  expect(indicesLine(observationRows([good, poor]))).toContain("1.54");
});

test("a test without a reading is told with its reason", () => {
  expect(texts(observationRows([reading({ kind: "density", method: "suspended" }, {}, "noResult")]))["Specific gravity"]).toBe("no reading: poor polish");
});
