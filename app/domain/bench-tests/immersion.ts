import { testForm } from "./test-form.ts";

export const immersion = testForm({
  kind: "immersion",
  name: "Immersion",
  hotkey: "i",
  instrumentKind: "immersionSet",
  needsInstrument: false,
  evidenceClass: "index",
  consent: "immersionLiquid",
  caution: "Liquids harm porous, organic, glued, filled and foiled stones, and many are toxic: gloves, air, the safety sheet and local rules first; wash the stone after.",
  fields: [
    { type: "choice", name: "comparison", label: "The stone's index is", isRequired: true, refusal: "Choose whether it is above or below the liquid's.", options: { higher: "Above the liquid's", near: "Near the liquid's", lower: "Below the liquid's" } },
    { type: "choice", name: "liquid", label: "Liquid", isRequired: true, refusal: "Choose the liquid.", isCondition: true, options: { water: "Water, 1.333", glycerol: "Glycerol, 1.473", benzylBenzoate: "Benzyl benzoate, 1.57", bromonaphthalene: "1-Bromonaphthalene, 1.66", diiodomethane: "Diiodomethane, 1.74" } },
    { type: "choice", name: "relief", label: "Relief", isRequired: false, options: { veryLow: "Very low", low: "Low", moderate: "Moderate", high: "High", veryHigh: "Very high" } },
    { type: "choice", name: "method", label: "Told by", isRequired: false, isCondition: true, options: { relief: "Relief", becke: "Becke line", borders: "Bright or dark borders" } },
    { type: "words", name: "text", label: "What else was seen", lines: 2, most: 500, isRequired: false, hint: "Striae, zoning, halos of diffusion, the plane of a join." },
  ],
});
