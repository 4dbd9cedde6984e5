import { testForm } from "./test-form.ts";

export const colourFilter = testForm({
  kind: "colourFilter",
  name: "Colour filter",
  hotkey: "f",
  instrumentKind: "colourFilter",
  needsInstrument: false,
  evidenceClass: null,
  consent: null,
  caution: null,
  fields: [
    { type: "choice", name: "appearsAs", label: "Through the filter", isRequired: true, refusal: "Choose how the stone looks through the filter.", hint: "Chromium and cobalt look red. Many natural emeralds do not: never decisive alone.", options: { green: "Green, or no change", brownish: "Brownish", pink: "Pink", red: "Red", strongRed: "Strong red" } },
    { type: "choice", name: "light", label: "Light", isRequired: true, refusal: "Choose the light: many white lamps hold too little red for this filter.", isCondition: true, options: { incandescent: "Incandescent", warmLed: "Warm LED, rich in red", daylight: "Daylight" } },
  ],
});
