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

test("what goes beyond version 1's first fields is accepted as well", () => {
  expect(
    parseEvidence({
      ri: [
        { kind: "interval", low: 1.5, high: 1.6, quality: "poor" },
        { kind: "estimate", n: 2.41, u: 0.03, by: "brewster" },
        { kind: "rotation", solutions: [{ indices: { alpha: 1.61, beta: 1.613, gamma: 1.62 }, u: 0.0006, weight: 0.5 }, { indices: { omega: 1.544, epsilon: 1.553 } }, { indices: { n: 1.52 } }] },
      ],
      sg: { value: 3, quality: "fair" },
      heavyLiquids: [{ behaviour: "sinks", liquidSg: 2.65, uLiquidSg: 0.01 }],
      absorption: [{ nm: 505, kind: "band", u: 1 }],
    }),
  ).toMatchObject({ ok: true });
  expect(parseEvidence({ absorption: [], heavyLiquids: [] })).toMatchObject({ ok: true });
});

test.each([
  [{ ri: [{ kind: "interval", low: 1.6, high: 1.5 }] }, "ri[0].low"],
  [{ ri: [{ kind: "interval", low: 1.6 }] }, "ri[0].high"],
  [{ ri: [{ kind: "estimate", n: 2.4, by: "brewster" }] }, "ri[0].u"],
  [{ ri: [{ kind: "estimate", n: 2.4, u: 0.1, by: "guess" }] }, "ri[0].by"],
  [{ ri: [{ kind: "rotation", solutions: [] }] }, "ri[0].solutions"],
  [{ ri: [{ kind: "rotation", solutions: [{ indices: { alpha: 1.6 } }] }] }, "ri[0].solutions[0].indices"],
  [{ ri: [{ kind: "rotation", solutions: [{ indices: { alpha: 1.62, beta: 1.61, gamma: 1.63 } }] }] }, "ri[0].solutions[0].indices.alpha"],
  [{ ri: [{ kind: "rotation", solutions: [{ indices: { n: 1.6 }, weight: 0 }] }] }, "ri[0].solutions[0].weight"],
  [{ ri: [{ kind: "rotation", solutions: [{ indices: { n: 1.6, omega: 1.5 } }] }] }, "ri[0].solutions[0].indices"],
  [{ ri: [{ kind: "single", n: 1.6, quality: "superb" }] }, "ri[0].quality"],
  [{ heavyLiquids: [{ behaviour: "hovers", liquidSg: 2.65 }] }, "heavyLiquids[0].behaviour"],
  [{ heavyLiquids: [{ behaviour: "sinks", liquidSg: 13.6 }] }, "heavyLiquids[0].liquidSg"],
  [{ absorption: [{ nm: 505, kind: "line", u: 0 }] }, "absorption[0].u"],
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
