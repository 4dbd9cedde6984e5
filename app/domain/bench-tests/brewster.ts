import { testForm } from "./test-form.ts";

export const brewster = testForm({
  kind: "brewster",
  name: "Brewster angle",
  hotkey: "b",
  instrumentKind: "brewsterMeter",
  needsInstrument: true,
  evidenceClass: "index",
  consent: null,
  caution: "Laser: never look into it or its reflection, and keep facets from throwing it about; the rules for its class hold.",
  fields: [
    { type: "number", name: "brewsterDeg", label: "Angle of least reflection", what: "the angle", unit: "deg", min: 50, max: 75, mostDecimals: 2, example: "67.5", isRequired: true, isReadOnInstrument: true, u: 0.3 },
    { type: "choice", name: "facet", label: "Facet", isRequired: false, isCondition: true, options: { table: "Table", crown: "Crown", pavilion: "Pavilion", other: "Another facet" } },
  ],
});
