import { testForm } from "./test-form.ts";

export const spectroscope = testForm({
  kind: "spectroscope",
  name: "Spectroscope",
  hotkey: "s",
  instrumentKind: "spectroscope",
  needsInstrument: true,
  evidenceClass: "spectrum",
  consent: null,
  caution: "Lamps heat: keep the stone cool, whose lines are then sharper too. Never look into a beam.",
  fields: [
    { type: "words", name: "lines", label: "Lines and bands", lines: 2, most: 500, isRequired: false, example: "694 e, 668 weak, 540-580 band", hint: "Nanometres from 380 to 780, with commas between: a line “694”, a band “540-580”; strong, medium, weak or faint after it, “e” where it shines. Empty: no spectrum seen." },
    { type: "choice", name: "scale", label: "Instrument's spread", isRequired: true, refusal: "Choose what spreads the light: their lines are read to different widths.", isCondition: true, options: { grating: "Diffraction grating", prism: "Prism", digital: "Digital" } },
    { type: "choice", name: "path", label: "Light", isRequired: false, isCondition: true, options: { transmitted: "Transmitted", reflected: "Reflected inside", scattered: "Scattered" } },
    { type: "words", name: "direction", label: "Direction", lines: 1, most: 80, isRequired: false, isCondition: true, example: "through table and pavilion" },
  ],
});
