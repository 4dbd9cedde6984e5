import { testForm } from "./test-form.ts";

export const ultraviolet = testForm({
  kind: "ultraviolet",
  name: "Ultraviolet",
  hotkey: "u",
  instrumentKind: "uvLamp",
  needsInstrument: true,
  evidenceClass: "seen",
  consent: "ultraviolet",
  caution: "Short wave harms eyes and skin within seconds to minutes: closed cabinet or shield, gloves, and the rules of your house first. Long exposure fades or changes kunzite, maxixe beryl, hackmanite, some zircon, topaz and irradiated stones.",
  fields: [
    { type: "choice", name: "strength", label: "Fluorescence", isRequired: true, refusal: "Choose how strongly it fluoresces, or that it is inert.", options: { inert: "Inert", veryWeak: "Very weak", weak: "Weak", moderate: "Moderate", strong: "Strong", veryStrong: "Very strong" } },
    { type: "choice", name: "wave", label: "Lamp", isRequired: true, refusal: "Choose the lamp's wave.", isCondition: true, options: { longWave: "Long wave, 365 nm", shortWave: "Short wave, 254 nm", middleWave: "Middle wave, 302–312 nm" } },
    { type: "words", name: "colour", label: "Colour of the glow", lines: 1, most: 60, isRequired: false, example: "red" },
    { type: "choice", name: "evenness", label: "Spread", isRequired: false, options: { even: "Even", patchy: "Patchy", zoned: "Zoned", surface: "At the surface only", fissures: "In fissures only" } },
    { type: "tick", name: "isChalky", label: "Chalky", words: "chalky" },
    { type: "number", name: "phosphorescenceS", label: "Glow after the lamp", what: "the afterglow", unit: "s", min: 0, max: 3600, mostDecimals: 0, example: "5", isRequired: false, isWhole: true, u: null },
    { type: "number", name: "distanceCm", label: "Distance", what: "the distance", unit: "cm", min: 1, max: 50, mostDecimals: 1, example: "5", isRequired: false, isCondition: true, u: null },
    { type: "number", name: "exposureS", label: "Exposure", what: "the exposure", unit: "s", min: 1, max: 3600, mostDecimals: 0, example: "30", isRequired: false, isCondition: true, isWhole: true, u: null },
  ],
});
