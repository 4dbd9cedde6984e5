import { expect, test } from "vitest";
import { describedKinds, testForms, type DescribedKind } from "#app/domain/bench-tests/test-forms.ts";
import { aboutTest, observationKinds } from "#app/domain/reading.ts";
import { composeReading } from "#app/features/readings/compose-reading.ts";
import { evidenceFromReadings } from "#app/features/readings/evidence-from-readings.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import { readingForm } from "#app/features/readings/reading-forms.server.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { readingConditions, readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { parseWithZod } from "@conform-to/zod/v4";
import { aForm } from "../../setup/bench-factory.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";

type Typed = Readonly<Record<string, string | readonly string[]>>;
const instrument: ReadingInstrument = { resolution: null, standardUncertainty: null, upperLimit: null, prismIndex: null };
const compose = (kind: DescribedKind, typed: Typed, quality: "good" | "noResult" = "good") => composeReading({ kind, quality, typed }, instrument);

/** A whole reading of each, as its form sends it, and what is told of it. */
const whole: Readonly<Record<DescribedKind, { typed: Typed; value: string; seen?: string; conditions?: string }>> = {
  appearance: { typed: { colour: "light purplish red", transparency: "transparent", lustre: "vitreous", phenomena: ["asterism"], light: "daylight 6500 K" }, value: "light purplish red", seen: "transparent, lustre: vitreous, asterism", conditions: "daylight 6500 K" },
  magnification: { typed: { features: ["curvedStriae", "gasBubbles"], doubling: "none", text: "at 4 o’clock", magnificationX: "40", illumination: "darkField" }, value: "Curved striae, gas bubbles", seen: "doubling of edges: none seen, at 4 o’clock", conditions: "40×, dark field" },
  dichroscope: { typed: { strength: "strong", colours: "purplish red, orangish red", directionsTried: "3", polarisers: "calcite" }, value: "Strong", seen: "purplish red, orangish red", conditions: "3 directions, calcite" },
  spectroscope: { typed: { lines: "694 e, 540-580 band", scale: "grating", path: "transmitted" }, value: "694 e, 540-580 band", conditions: "diffraction grating, transmitted" },
  ultraviolet: { typed: { strength: "strong", wave: "longWave", colour: "red", evenness: "even", isChalky: "on", phosphorescenceS: "0", distanceCm: "5" }, value: "Strong", seen: "red, even, chalky, no afterglow", conditions: "long wave, 365 nm, distance 5 cm" },
  colourFilter: { typed: { appearsAs: "strongRed", light: "incandescent" }, value: "Strong red", conditions: "incandescent" },
  thermalProbe: { typed: { zone: "diamond", pointsTried: "3", tempC: "21" }, value: "Diamond's range", conditions: "3 points, stone and room 21 °C" },
  conductivity: { typed: { response: "conducts", pointsTried: "3" }, value: "Conducts", conditions: "3 points" },
  magnet: { typed: { response: "moderate", method: "float" }, value: "Moderate, drags", conditions: "floating on water" },
  immersion: { typed: { comparison: "higher", liquid: "diiodomethane", relief: "high", method: "becke" }, value: "Above the liquid's", seen: "relief: high", conditions: "diiodomethane, 1.74, becke line" },
  reflectivity: { typed: { reflectancePercent: "17.2", source: "visible", facet: "table" }, value: "n 2.417 ± 0.035", seen: "17.2 %", conditions: "visible, table" },
  brewster: { typed: { brewsterDeg: "67.5", facet: "table" }, value: "n 2.414 ± 0.036", seen: "67.5°", conditions: "table" },
  realDepth: { typed: { realMm: "4.12", apparentMm: "2.33" }, value: "n 1.768 ± 0.017", seen: "4.12 mm, 2.33 mm" },
  heavyLiquid: { typed: { behaviour: "suspended", liquidSg: "3.32", tempC: "20" }, value: "Stays suspended", seen: "3.32", conditions: "liquid 20 °C" },
};

test.each(describedKinds)("a whole reading of %s is kept and told in the words of its form", (kind) => {
  const { typed, value, seen = "", conditions = "" } = whole[kind];
  const { reading, problems } = compose(kind, typed);
  expect(problems).toBeUndefined();
  expect([readingValueText(reading!), readingSeenText(reading!), readingConditions(reading!)]).toEqual([value, seen, conditions]);
});

test.each(describedKinds)("%s is read from a form as it is typed just as the server reads it", (kind) => {
  const form = aForm({ requestId: newRequestId(), kind, quality: "good", ...whole[kind].typed });
  const sent = parseWithZod(form, { schema: readingForm });
  expect(sent.status).toBe("success");
  const onServer = sent.status === "success" ? composeReading(sent.value.draft as never, instrument) : null;
  expect(onServer).toEqual(composeReading(readingDraftFromForm(form) as never, instrument));
});

test.each(describedKinds)("an empty form of %s is refused beside what it asks for; a reason for no reading is enough", (kind) => {
  const required = testForms[kind].fields.filter((field) => "isRequired" in field && field.isRequired).map(({ name }) => name);
  if (required.length > 0) expect(Object.keys(compose(kind, {}).problems ?? {}).sort()).toEqual(expect.arrayContaining(required.sort()));
  const none = compose(kind, {}, "noResult");
  expect(none.reading?.values).toEqual([]);
});

test.each<[DescribedKind, string, Typed, string, RegExp]>([
  ["appearance", "no colour", { colour: " " }, "colour", /Write the colour/],
  ["appearance", "a transparency of nobody's", { transparency: "see-through" }, "transparency", /from the list/],
  ["appearance", "a phenomenon of nobody's", { phenomena: ["asterism", "magic"] }, "phenomena", /from the list/],
  ["appearance", "a novel", { colour: "x".repeat(81) }, "colour", /At most 80 characters; this is 81/],
  ["dichroscope", "none seen in two colours", { strength: "none" }, "colours", /no two colours/],
  ["dichroscope", "one colour", { colours: "red" }, "colours", /two or three/],
  ["dichroscope", "four colours", { colours: "red, blue, green, brown" }, "colours", /more than three/],
  ["dichroscope", "no direction", { directionsTried: "0" }, "directionsTried", /between 1 and 12/],
  ["dichroscope", "half a direction", { directionsTried: "2.5" }, "directionsTried", /whole number/],
  ["spectroscope", "a line in the infrared", { lines: "900" }, "lines", /outside 380 to 780/],
  ["spectroscope", "a word for a line", { lines: "694, chromium" }, "lines", /“chromium” is no line/],
  ["spectroscope", "an unknown word", { lines: "694 bright" }, "lines", /“bright” is not understood/],
  ["spectroscope", "a band backwards", { lines: "580-540" }, "lines", /shorter to the longer/],
  ["ultraviolet", "an inert stone that glows red", { strength: "inert" }, "colour", /inert stone has no colour/],
  ["ultraviolet", "an hour and more of lamp", { exposureS: "99999" }, "exposureS", /between 1 s and 3600 s/],
  ["magnification", "nothing seen that is something", { features: ["noInclusions", "needles"] }, "features", /exclude each other/],
  ["magnification", "nothing at all", { features: [], doubling: "", text: "" }, "features", /Tick what was seen/],
  ["magnification", "a magnification of 10,000", { magnificationX: "10000" }, "magnificationX", /between 2× and 400×/],
  ["immersion", "high relief near the liquid's index", { comparison: "near" }, "relief", /stands out little/],
  ["reflectivity", "half of the light", { reflectancePercent: "50" }, "reflectancePercent", /between 1 % and 35 %/],
  ["brewster", "a right angle", { brewsterDeg: "90" }, "brewsterDeg", /between 50° and 75°/],
  ["realDepth", "depths exchanged", { realMm: "2.33", apparentMm: "4.12" }, "apparentMm", /exchanged/],
  ["realDepth", "an index that no stone has", { realMm: "20", apparentMm: "2" }, "apparentMm", /which no stone has/],
  ["heavyLiquid", "a liquid like lead", { liquidSg: "11" }, "liquidSg", /between 0.7 and 5/],
  ["thermalProbe", "words for a count", { pointsTried: "some" }, "pointsTried", /in digits/],
  ["conductivity", "a script for a count", { pointsTried: "<script>" }, "pointsTried", /in digits/],
  ["magnet", "no method", { method: "" }, "method", /Choose how it was tried/],
])("%s: %s is refused beside its field", (kind, _, change, field, message) => {
  expect(compose(kind, { ...whole[kind].typed, ...change }).problems?.[field]?.[0]).toMatch(message);
});

test("what every described test saw is evidence that the ranking takes", () => {
  const readings = describedKinds.map((kind) => compose(kind, whole[kind].typed).reading!);
  const evidence = evidenceFromReadings(readings);
  expect(parseEvidence(JSON.parse(JSON.stringify(evidence)))).toMatchObject({ ok: true });
  expect(evidence).toMatchObject({
    colour: ["purplish red"], transparency: "transparent", lustre: "vitreous", phenomena: ["asterism"],
    pleochroism: { strength: "strong", colours: ["purplish red", "orangish red"] },
    fluorescence: { longWave: { strength: "strong", colour: "red" } },
    absorption: [{ nm: 560, kind: "band", u: 1.7 }],
    colourFilter: "strong red", thermal: "diamond-like", magnetic: "moderate", features: ["curved striae", "gas bubbles"],
    heavyLiquids: [{ behaviour: "suspended", liquidSg: 3.32, uLiquidSg: 0.01 }],
  });
  // Above diiodomethane is over 1.74; the three coarse indices come with their own uncertainty.
  expect(evidence.ri).toEqual(expect.arrayContaining([{ kind: "overLimit", limit: 1.74 }, expect.objectContaining({ kind: "estimate", by: "reflectance", n: expect.closeTo(2.417, 2) })]));
});

test("a struck or empty reading of a described test is no evidence", () => {
  const seen = compose("thermalProbe", whole.thermalProbe.typed).reading!;
  expect(evidenceFromReadings([{ ...seen, strike: {} }])).toEqual({});
  expect(evidenceFromReadings([compose("thermalProbe", {}, "noResult").reading!])).toEqual({});
});

test("every test has a key of its own, a name, and a caution where it can do harm", () => {
  const keys = observationKinds.map((kind) => aboutTest(kind).hotkey);
  expect(new Set(keys).size).toBe(observationKinds.length);
  expect(keys).not.toContain("/");
  for (const kind of ["refractometer", "ultraviolet", "thermalProbe", "heavyLiquid", "immersion", "brewster", "reflectivity", "magnet"] as const) expect(aboutTest(kind).caution, kind).toBeTruthy();
});
