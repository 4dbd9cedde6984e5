import fc from "fast-check";
import { expect, test } from "vitest";
import { parcelColumns, type ParcelColumn } from "#app/domain/parcel.ts";
import { rowEvidence } from "#app/features/parcels/row-evidence.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";

const read = (cells: Partial<Record<ParcelColumn, string>>, waterTempC: number | null = null) => {
  const columns = Object.keys(cells) as ParcelColumn[];
  const { evidence, problems, figures } = rowEvidence(Object.values(cells), { columns, waterTempC });
  return { evidence, figures, problems: Object.fromEntries(Object.entries(problems).map(([at, message]) => [columns[Number(at)], message])) };
};

test("whatever is typed, the evidence is what the ranking takes", () => {
  const cell = fc.oneof(fc.string({ maxLength: 130 }), fc.double().map(String), fc.constantFrom("", "1.762", "strong red", "inert", "DR", "+", "550b 694", "0", "-1", "99999", "1,54"));
  fc.assert(
    fc.property(fc.array(cell, { minLength: parcelColumns.length, maxLength: parcelColumns.length }), fc.option(fc.double({ min: 0, max: 40, noNaN: true })), (cells, waterTempC) => {
      const { evidence } = rowEvidence(cells, { columns: parcelColumns, waterTempC });
      expect(parseEvidence(evidence)).toMatchObject({ ok: true });
    }),
  );
});

test("a row is read whole", () => {
  expect(read({ mark: "A7", weightCt: "0,142", riLow: "1.762", riHigh: "1.770", sg: "3.99", character: "DR", colour: "purplish red / pink", longWave: "strong red", absorption: "694 550b", note: "nice" })).toMatchObject({
    problems: {},
    evidence: {
      ri: [{ kind: "edges", low: 1.762, high: 1.77, rotated: false }], sg: { value: 3.99 }, opticCharacter: "anisotropic", colour: ["purplish red", "pink"],
      fluorescence: { longWave: { strength: "strong", colour: "red" } }, absorption: [{ nm: 694, kind: "line" }, { nm: 550, kind: "band" }],
    },
    figures: { weightCt: { value: 0.142 } },
  });
  expect(read({ riLow: "1.718", riHigh: "" }).evidence).toMatchObject({ ri: [{ kind: "single", n: 1.718 }] });
  expect(read({ colour: "" }).evidence).toEqual({});
});

test("two weighings give the density, by the water's temperature", () => {
  // 2.143 ct of which 1.608 ct are left in water at 21.4 °C: 2.143 / 0.535 × 0.9979 = 3.997 (formulas §8).
  expect(read({ weightCt: "2.143", waterCt: "1.608" }, 21.4).evidence.sg!.value).toBeCloseTo(3.997, 2);
});

test.each([
  [{ riLow: "abc" }, "riLow", /digits/],
  [{ riLow: "17.62" }, "riLow", /between 1.3 and 2.1/],
  [{ riLow: "1.76255" }, "riLow", /four decimals|4 decimals/],
  [{ riLow: "1.770", riHigh: "1.762" }, "riHigh", /exchanged/],
  [{ riLow: "", riHigh: "1.762" }, "riHigh", /low edge/],
  [{ weightCt: "0" }, "weightCt", /between/],
  [{ weightCt: "1.0", waterCt: "1.2" }, "waterCt", /Less than the weight in air/],
  [{ weightCt: "1.0", waterCt: "0.7" }, "waterCt", /temperature/],
  [{ weightCt: "", waterCt: "0.7" }, "waterCt", /weight in air/],
  [{ sg: "1e9" }, "sg", /digits/],
  [{ character: "yes" }, "character", /isotropic/],
  [{ sign: "0" }, "sign", /\+ or -/],
  [{ longWave: "red" }, "longWave", /Begin with inert/],
  [{ absorption: "694 red" }, "absorption", /wavelengths/],
  [{ absorption: "900" }, "absorption", /wavelengths/],
  [{ note: "x".repeat(200) }, "note", /120 characters/],
] as const)("%o is refused at %s", (cells, column, message) => {
  expect(read(cells).problems[column]).toMatch(message);
});
