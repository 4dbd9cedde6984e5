import { testForm } from "./test-form.ts";

export const heavyLiquid = testForm({
  kind: "heavyLiquid",
  name: "Heavy liquid",
  hotkey: "h",
  instrumentKind: "heavyLiquids",
  needsInstrument: false,
  evidenceClass: "density",
  consent: "heavyLiquid",
  caution: "Heavy liquids are toxic, some of them highly: extraction, gloves, a trained person and local rules first. They ruin porous, organic, filled, glued and coated stones. Weighing is safer.",
  fields: [
    { type: "choice", name: "behaviour", label: "The stone", isRequired: true, refusal: "Choose what the stone did.", options: { floats: "Floats", suspended: "Stays suspended", sinksSlowly: "Sinks slowly", sinks: "Sinks" } },
    { type: "number", name: "liquidSg", label: "Liquid's density", what: "the liquid's density", unit: "1", min: 0.7, max: 5, mostDecimals: 3, example: "3.32", isRequired: true, isReadOnInstrument: true, u: 0.01, hint: "By a marker crystal today: warmth and evaporation move it." },
    { type: "number", name: "tempC", label: "Liquid", what: "the liquid's temperature", unit: "degC", min: 0, max: 40, mostDecimals: 1, example: "21", isRequired: false, isCondition: true, u: 0.5 },
  ],
});
