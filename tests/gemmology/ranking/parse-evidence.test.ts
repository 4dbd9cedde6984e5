import { expect, test } from "vitest";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";

test("evidence of every kind is accepted", () => {
  expect(
    parseEvidence({
      id: "a",
      ri: [
        { kind: "edges", low: 1.762, high: 1.77, u: 0.0015, rotated: true },
        { kind: "single", n: 1.718 },
        { kind: "spot", n: 1.54, u: 0.006 },
        { kind: "criticalAngle", angleDeg: 55.227, prismN: 1.88, u: 0.03 },
        { kind: "overLimit", limit: 1.81 },
      ],
      birefringence: { value: 0.008, u: 0.0012 },
      opticCharacter: "uniaxial",
      opticSign: "-",
      sg: { value: 3.997, u: 0.021 },
      colour: ["purplish red"],
      transparency: "transparent",
      lustre: "vitreous",
      pleochroism: { strength: "strong", colours: ["purplish red", "orange-red"] },
      fluorescence: { longWave: { strength: "strong", colour: "red" }, shortWave: { strength: "inert" } },
      absorption: [{ nm: 694, kind: "line" }],
      colourFilter: "red",
      phenomena: ["asterism"],
      thermal: "inert",
      magnetic: "inert",
      features: ["curved striae"],
    }),
  ).toMatchObject({ ok: true });
});

test.each([
  [{ weight: 3 }, "weight"],
  [{ ri: [{ kind: "single", n: 0.5 }] }, "ri[0].n"],
  [{ ri: [{ kind: "edges", low: 1.77, high: 1.76, rotated: true }] }, "ri[0].low"],
  [{ ri: [{ kind: "edges", low: 1.76, high: 1.77 }] }, "ri[0].rotated"],
  [{ ri: [{ kind: "guess", n: 1.5 }] }, "ri[0].kind"],
  [{ ri: [{ kind: "constructor" }] }, "ri[0].kind"],
  [{ ri: { kind: "single", n: 1.5 } }, "ri"],
  [{ ri: [{ kind: "criticalAngle", angleDeg: 20, prismN: 1.88 }] }, "ri[0].angleDeg"],
  [{ sg: { value: -1 } }, "sg.value"],
  [{ sg: { value: 1e9 } }, "sg.value"],
  [{ sg: { value: 3, u: 0 } }, "sg.u"],
  [{ sg: { value: "3.5" } }, "sg.value"],
  [{ sg: { value: Number.NaN } }, "sg.value"],
  [{ opticCharacter: "sideways" }, "opticCharacter"],
  [{ colour: ["x".repeat(201)] }, "colour[0]"],
  [JSON.parse('{"__proto__": 1}'), "__proto__"],
  [null, ""],
  [[], ""],
  ["evidence", ""],
])("%j is refused at %s", (value, path) => {
  const parsed = parseEvidence(value);
  expect(parsed.ok).toBe(false);
  if (!parsed.ok) expect(parsed.errors.map((error) => error.path)).toContain(path);
});
