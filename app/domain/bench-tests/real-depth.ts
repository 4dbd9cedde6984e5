import { testForm } from "./test-form.ts";

export const realDepth = testForm({
  kind: "realDepth",
  name: "Real and apparent depth",
  hotkey: "p",
  instrumentKind: "microscope",
  needsInstrument: true,
  evidenceClass: "index",
  consent: null,
  caution: null,
  fields: [
    { type: "number", name: "realMm", label: "Real depth", what: "the real depth", unit: "mm", min: 0.5, max: 200, mostDecimals: 3, example: "4.12", isRequired: true, u: 0.02, hint: "Three millimetres or more, between faces that lie parallel." },
    { type: "number", name: "apparentMm", label: "Travel of the focus", what: "the travel of the focus", unit: "mm", min: 0.1, max: 200, mostDecimals: 3, example: "2.33", isRequired: true, isReadOnInstrument: true, u: 0.02 },
    { type: "number", name: "numericalAperture", label: "Objective's aperture", what: "the numerical aperture", unit: "1", min: 0, max: 0.9, mostDecimals: 2, example: "0.10", isRequired: false, isCondition: true, u: null, hint: "A wide one makes the index read high." },
  ],
});
