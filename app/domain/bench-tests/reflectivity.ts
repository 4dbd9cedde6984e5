import { testForm } from "./test-form.ts";

export const reflectivity = testForm({
  kind: "reflectivity",
  name: "Reflectivity",
  hotkey: "r",
  instrumentKind: "reflectivityMeter",
  needsInstrument: true,
  evidenceClass: "index",
  consent: null,
  caution: "Some meters hold a laser: never look into it or its reflection. Only says “consistent with”: coatings, scratches and light from behind bias it.",
  fields: [
    { type: "number", name: "reflectancePercent", label: "Reflectance", what: "the reflectance", unit: "%", min: 1, max: 35, mostDecimals: 2, example: "17.2", isRequired: true, isReadOnInstrument: true, u: 0.5, hint: "Of one clean, flat, well polished face that covers the window." },
    { type: "choice", name: "source", label: "Light", isRequired: true, refusal: "Choose the meter's light: infrared reads dispersive stones low.", isCondition: true, options: { visible: "Visible", infrared: "Infrared" } },
    { type: "choice", name: "facet", label: "Facet", isRequired: false, isCondition: true, options: { table: "Table", crown: "Crown", pavilion: "Pavilion", other: "Another facet" } },
  ],
});
