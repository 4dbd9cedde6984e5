import { testForm } from "./test-form.ts";

export const dichroscope = testForm({
  kind: "dichroscope",
  name: "Dichroscope",
  hotkey: "d",
  instrumentKind: "dichroscope",
  needsInstrument: true,
  evidenceClass: "character",
  consent: null,
  caution: null,
  fields: [
    { type: "choice", name: "strength", label: "Pleochroism", isRequired: true, refusal: "Choose how strong it is, or that none was seen.", hint: "None seen proves nothing; two colours prove double refraction, if they are no zoning and no reflection.", options: { none: "None seen", weak: "Weak", moderate: "Moderate", strong: "Strong", veryStrong: "Very strong" } },
    { type: "words", name: "colours", label: "Colours", lines: 1, most: 160, isRequired: false, example: "purplish red, orangish red", hint: "Two, or three over several directions, with commas between." },
    { type: "number", name: "directionsTried", label: "Directions tried", what: "in how many directions", unit: "1", min: 1, max: 12, mostDecimals: 0, example: "3", isRequired: true, isWhole: true, isCondition: true, u: null, hint: "At least three: along an optic axis no stone shows any." },
    { type: "choice", name: "polarisers", label: "Made with", isRequired: false, isCondition: true, options: { calcite: "Calcite", sheet: "Polarising sheets" } },
  ],
});
