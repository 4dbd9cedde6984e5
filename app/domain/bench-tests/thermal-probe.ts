import { testForm } from "./test-form.ts";

export const thermalProbe = testForm({
  kind: "thermalProbe",
  name: "Thermal probe",
  hotkey: "t",
  instrumentKind: "thermalProbe",
  needsInstrument: true,
  evidenceClass: "seen",
  consent: "thermalProbe",
  caution: "The tip is hot and hard: it chips edges and marks soft or coated stones. Clean, dry, between 18 and 30 °C, away from metal.",
  fields: [
    { type: "choice", name: "zone", label: "Shown", isRequired: true, refusal: "Choose what the probe showed.", hint: "Moissanite shows as diamond here; so do warm stones and nearby metal. It never tells natural from laboratory-grown.", options: { low: "Below corundum", corundum: "Corundum's range", diamond: "Diamond's range" } },
    { type: "number", name: "pointsTried", label: "Points tried", what: "at how many points", unit: "1", min: 1, max: 12, mostDecimals: 0, example: "3", isRequired: true, isWhole: true, isCondition: true, u: null },
    { type: "number", name: "tempC", label: "Stone and room", what: "the temperature", unit: "degC", min: 0, max: 45, mostDecimals: 1, example: "21", isRequired: false, isCondition: true, u: null },
  ],
});
