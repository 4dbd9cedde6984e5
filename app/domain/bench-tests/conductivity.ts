import { testForm } from "./test-form.ts";

export const conductivity = testForm({
  kind: "conductivity",
  name: "Conductivity",
  hotkey: "e",
  instrumentKind: "conductivityMeter",
  needsInstrument: true,
  evidenceClass: "seen",
  consent: null,
  caution: "Tips under voltage: dry stone, dry hands, the maker's limits.",
  fields: [
    { type: "choice", name: "response", label: "Between the tips", isRequired: true, refusal: "Choose whether it conducts.", hint: "Most moissanite conducts, some does not; so do blue diamonds with boron. A damp surface conducts too.", options: { none: "Does not conduct", partly: "Conducts at some points", conducts: "Conducts" } },
    { type: "number", name: "pointsTried", label: "Points tried", what: "at how many points", unit: "1", min: 1, max: 12, mostDecimals: 0, example: "3", isRequired: true, isWhole: true, isCondition: true, u: null },
  ],
});
