import { testForm } from "./test-form.ts";

/** What the eye sees before any instrument. The hues are the project's own neutral list, without trade names. */
export const hues = [
  "colourless", "white", "grey", "black", "brown", "red", "orangish red", "purplish red", "pink", "orange", "yellowish orange", "yellow", "greenish yellow",
  "yellowish green", "green", "bluish green", "greenish blue", "blue", "violetish blue", "violet", "purple", "reddish purple", "multicoloured",
] as const;

export const appearance = testForm({
  kind: "appearance",
  name: "Appearance",
  hotkey: "a",
  instrumentKind: null,
  needsInstrument: false,
  evidenceClass: "seen",
  consent: null,
  caution: null,
  fields: [
    { type: "words", name: "colour", label: "Colour", lines: 1, most: 80, isRequired: true, refusal: "Write the colour, face up: “purplish red”.", example: "purplish red", hint: "Hue last: “purplish red”, “light bluish green”. No trade names." },
    { type: "choice", name: "transparency", label: "Transparency", isRequired: true, refusal: "Choose how transparent the stone is.", options: { transparent: "Transparent", semiTransparent: "Semi-transparent", translucent: "Translucent", semiTranslucent: "Semi-translucent", opaque: "Opaque" } },
    { type: "choice", name: "lustre", label: "Lustre", isRequired: false, options: { adamantine: "Adamantine", subadamantine: "Subadamantine", vitreous: "Vitreous", greasy: "Greasy", resinous: "Resinous", waxy: "Waxy", pearly: "Pearly", silky: "Silky", metallic: "Metallic", dull: "Dull" } },
    {
      type: "many", name: "phenomena", label: "Phenomena",
      options: { asterism: "Asterism", chatoyancy: "Chatoyancy", adularescence: "Adularescence", labradorescence: "Labradorescence", playOfColour: "Play of colour", iridescence: "Iridescence", aventurescence: "Aventurescence", colourChange: "Colour change", orient: "Orient" },
    },
    { type: "words", name: "light", label: "Light", lines: 1, most: 80, isRequired: false, isCondition: true, example: "daylight lamp, 6500 K" },
    { type: "words", name: "distribution", label: "Distribution of colour", lines: 1, most: 200, isRequired: false, example: "zoned, not face up" },
  ],
});
