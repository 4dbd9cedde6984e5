import { testForm } from "./test-form.ts";

export const magnet = testForm({
  kind: "magnet",
  name: "Magnet",
  hotkey: "g",
  instrumentKind: "magnet",
  needsInstrument: false,
  evidenceClass: "seen",
  consent: null,
  caution: "Strong magnets pinch, and harm pacemakers, cards and watches: keep them away.",
  fields: [
    { type: "choice", name: "response", label: "Response", isRequired: true, refusal: "Choose what the stone did.", options: { repelled: "Repelled", inert: "Inert", weak: "Weak", moderate: "Moderate, drags", strong: "Strong, is picked up" } },
    { type: "choice", name: "method", label: "How", isRequired: true, refusal: "Choose how it was tried: floating shows far less than touching needs.", isCondition: true, options: { float: "Floating on water", direct: "Wand held to it" } },
    { type: "tick", name: "hasMetal", label: "Setting or steel inclusions near", words: "metal near" },
  ],
});
