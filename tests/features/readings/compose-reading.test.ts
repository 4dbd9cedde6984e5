import { expect, test } from "vitest";
import { composeReading, type QuickDraft } from "#app/features/readings/compose-reading.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import { aForm, corundum } from "../../setup/bench-factory.ts";

const instrument: ReadingInstrument = { resolution: 0.001, standardUncertainty: null, upperLimit: 1.81, prismIndex: 1.88 };
const problems = (draft: QuickDraft, on: ReadingInstrument | null = instrument) => composeReading(draft, on).problems;
const { refractometer, density, weight, dimensions, polariscope, free } = corundum;
const angle = { kind: "criticalAngle", quality: "good", angleDeg: "55.23", prismN: "1.88", facet: "table", light: "sodium" } as const;
const long = "7".repeat(10_000);

test.each<[string, QuickDraft, string, RegExp]>([
  ["an index of 0.5", { ...refractometer, low: "0.5" }, "low", /^The low edge lies between 1.3 and 2.1\.$/],
  ["a low edge above the high one", { ...refractometer, low: "1.770", high: "1.762" }, "high", /^The high edge \(1\.762\) lies below the low edge \(1\.770\)/],
  ["two equal edges", { ...refractometer, high: "1.762" }, "high", /One edge only/],
  ["a gap no stone has", { ...refractometer, low: "1.40", high: "1.79" }, "high", /wider than any stone/],
  ["a second value for one edge", { ...refractometer, edges: "one" }, "high", /Leave this empty/],
  ["a forgotten edge", { ...refractometer, high: "" }, "high", /^Write the high edge\.$/],
  ["an edge beyond the liquid", { ...refractometer, high: "1.83" }, "high", /over the limit/],
  ["an index in words", { ...refractometer, low: "about 1.76" }, "low", /in digits: for example 1\.762/],
  ["ten thousand digits", { ...refractometer, low: long }, "low", /in digits/],
  ["an emoji", { ...refractometer, low: "💎" }, "low", /in digits/],
  ["a script tag", { ...weight, weightCt: "<script>alert(1)</script>" }, "weightCt", /in digits/],
  ["more decimals than the instrument shows", { ...weight, weightCt: "2.1435" }, "weightCt", /read to 0\.001/],
  ["more decimals than anything shows", { ...refractometer, low: "1.76212" }, "low", /At most 4 decimals/],
  ["a weight of −1 ct", { ...weight, weightCt: "-1" }, "weightCt", /^The weight is more than zero\.$/],
  ["a weight of 0 ct", { ...weight, weightCt: "0" }, "weightCt", /more than zero/],
  ["a weight of a thousand million carats", { ...weight, weightCt: "1000000000" }, "weightCt", /At most 500000 ct: is the unit right\?/],
  ["a weight as 10^9", { ...weight, weightCt: "10^9" }, "weightCt", /in digits/],
  ["a stone heavier in water than in air", { ...density, massLiquidCt: "2.500" }, "massLiquidCt", /^The weight in water must be less than the weight in air \(2\.143 ct\)\.$/],
  ["a weight in water below zero", { ...density, massLiquidCt: "-0.2" }, "massLiquidCt", /not less than zero/],
  ["a density no stone has", { ...density, massLiquidCt: "2.142" }, "massLiquidCt", /which no stone has/],
  ["boiling water", { ...density, tempC: "90" }, "tempC", /between 0 °C and 40 °C/],
  ["an angle of 0.5°", { ...angle, angleDeg: "0.5" }, "angleDeg", /between 30° and 89\.9°/],
  ["an angle read as its complement", { ...angle, angleDeg: "34.7" }, "angleDeg", /complement/],
  ["a prism of water", { ...angle, prismN: "1.33" }, "prismN", /between 1\.4 and 2\.7/],
  ["a stone of nothing", { ...dimensions, depthMm: "0" }, "depthMm", /at least 0\.1 mm/],
  ["a stone of a kilometre", { ...dimensions, lengthMm: "1000000" }, "lengthMm", /At most 500 mm/],
  ["a width above the length", { ...dimensions, widthMm: "9.00" }, "widthMm", /exchanged/],
  ["no direction tried", { ...polariscope, directionsTried: "0" }, "directionsTried", /from 1 to 12/],
  ["a sign without a figure", { ...polariscope, figure: "none", sign: "-" }, "sign", /interference figure/],
  ["a figure in an aggregate", { ...polariscope, behaviour: "staysLight" }, "figure", /shows no figure/],
  ["nothing seen", { ...free, text: "  " }, "text", /Write what was seen/],
  ["ten thousand characters", { ...free, text: "x".repeat(10_000) }, "text", /At most 1000 characters; this is 10000/],
])("%s is refused beside its field", (_, draft, field, message) => {
  const found = problems(draft);
  expect(found?.[field]?.[0]).toMatch(message);
});

test("what was seen may hold any letters, and is kept as it is", () => {
  const text = "Zweiphaseneinschlüsse 💎 <script>alert(1)</script>";
  expect(composeReading({ ...free, text }, null).reading?.detail).toEqual({ kind: "free", text });
});

test("no reading needs no numbers and gives none", () => {
  expect(composeReading({ ...density, quality: "noResult", massAirCt: "", massLiquidCt: "", tempC: "" }, null).reading).toEqual({ detail: { kind: "density", method: "suspended" }, quality: "noResult", values: [] });
});

test("a beaker on the pan and a stone hung in water weigh the same density", () => {
  const sg = (draft: QuickDraft) => composeReading(draft, instrument).reading!.values.find(({ name }) => name === "sg")!.value;
  expect(sg({ ...density, method: "beakerOnPan", massLiquidCt: "0.535" })).toBeCloseTo(sg(density), 2);
});

test("white light and a fair facet widen an edge's uncertainty; the laboratory's own study stands before the usual value", () => {
  const u = (draft: Partial<typeof refractometer> | object, on = instrument) => composeReading({ ...refractometer, ...draft } as QuickDraft, on).reading!.values[0]!.standardUncertainty;
  expect(u({})).toBe(0.0015);
  expect(u({ light: "white" })).toBe(0.003);
  expect(u({ quality: "fair" })).toBe(0.003);
  expect(u({}, { ...instrument, standardUncertainty: 0.0007 })).toBe(0.0007);
});

test("a form that is still being typed reads as a draft of the test that it shows", () => {
  const form = aForm({ kind: "refractometer", quality: "good", low: "1,76", light: "nonsense" });
  expect(readingDraftFromForm(form)).toEqual({ kind: "refractometer", quality: "good", edges: "two", low: "1,76", high: "", isRotated: false, facet: "table", light: "sodium" });
  expect(readingDraftFromForm(aForm({ kind: "polariscope" }))).toMatchObject({ behaviour: "cannotTell", figure: "notSought" });
});
