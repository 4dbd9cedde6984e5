import fc from "fast-check";
import { expect, test } from "vitest";
import { airDensityKgM3 } from "#app/gemmology/density/air-density.ts";
import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";
import { waterDensityKgM3 } from "#app/gemmology/density/water-density.ts";
import { weighingWarning } from "#app/gemmology/density/weighing-warning.ts";
import { meanOfRepeats } from "#app/gemmology/statistics/mean-of-repeats.ts";
import { randomFrom } from "../rotation/a-rotation-run.ts";
import { workedOn } from "../worked-on.ts";

const upTo40 = workedOn("water density g/cm3").filter(({ inputs }) => inputs.t_C! <= 40);

// The table is of an older temperature scale and for water with air in it: within 1e-5 near room temperature, less so at its ends.
test.each(upTo40)("$id: water at $inputs.t_C °C ($source)", ({ inputs, expected }) => {
  expect(Math.abs(waterDensityKgM3(inputs.t_C!) - expected.density! * 1000)).toBeLessThan(0.012);
});

test.each(workedOn("water density g/cm3").filter(({ inputs }) => inputs.t_C! > 40))("$id: water at $inputs.t_C °C is beyond the formula, which refuses it ($source)", ({ inputs }) => {
  expect(() => waterDensityKgM3(inputs.t_C!)).toThrow(`tempC out of range: ${inputs.t_C}`);
});

/** Kell, J. Chem. Eng. Data 20 (1975) 97: an independent formula, in the form that a worked example states. */
const kellKgM3 = (t: number) => (999.83952 + 16.945176 * t - 7.9870401e-3 * t ** 2 - 46.170461e-6 * t ** 3 + 105.56302e-9 * t ** 4 - 280.54253e-12 * t ** 5) / (1 + 16.87985e-3 * t);

test.each(workedOn("water density formula (Kell 1975)"))("$id: Kell's formula, checked at 25 °C, agrees with Tanaka's everywhere ($source)", ({ inputs, expected }) => {
  expect(kellKgM3(inputs.t_C!)).toBeCloseTo(expected.kg_m3!, 9);
  for (let tempC = 0; tempC <= 40; tempC += 0.5) expect(Math.abs(waterDensityKgM3(tempC) - kellKgM3(tempC))).toBeLessThan(0.004);
});

test("water at 20 °C agrees with IAPWS-95 (value recorded in a public project document)", () => {
  const [example] = workedOn("water density (CoolProp/IAPWS-95)");
  expect(Math.abs(waterDensityKgM3(example!.inputs.T_K! - 273.15) - example!.expected.kg_m3!)).toBeLessThan(0.002);
});

test.each([[15, 999.1], [16, 998.95], [18, 998.6], [20, 998.21], [22, 997.77], [25, 997.05], [30, 995.65]])("water at %s °C weighs %s kg/m³ (table after Tanaka 2001, two decimals)", (tempC, kgM3) => {
  expect(Math.abs(waterDensityKgM3(tempC) - kgM3)).toBeLessThanOrEqual(0.0051);
});

test.each([-0.1, 40.1, Number.NaN])("water at %s °C is refused", (tempC) => {
  expect(() => waterDensityKgM3(tempC)).toThrow(RangeError);
});

test("air at 20 °C, 1013.25 hPa and half saturated weighs 1.199 kg/m³ (simplified CIPM)", () => {
  expect(airDensityKgM3({ tempC: 20 })).toBeCloseTo(1.1993, 3);
});

test.each(workedOn("hydrostatic SG"))("$id: specific gravity by weighing ($source)", ({ inputs, expected }) => {
  const air = inputs.weight_air_ct ?? (inputs.weight_air_g ?? inputs.mass_air_g!) * 5;
  const water = inputs.wire_ct !== undefined ? inputs.weight_water_plus_wire_ct! - inputs.wire_ct : (inputs.weight_water_ct ?? (inputs.weight_water_g ?? inputs.mass_water_g!) * 5);
  const { sg } = hydrostaticDensity({ method: "suspended", massAirCt: air, massLiquidCt: water, tempC: 4, airDensityKgM3: 0 });
  const published = expected.sg ?? expected.sg_as_printed ?? expected.density_g_cm3!;
  // The books divide without buoyancy of the air and round to the digits printed.
  expect(Math.abs(sg - published)).toBeLessThanOrEqual(expected.sg_as_printed ? 0.023 : 0.0051);
});

test("5.216 ct in air and 3.914 ct in water at 21.5 °C are 3994.1 ± 12.8 kg/m³", () => {
  const result = hydrostaticDensity({ method: "suspended", massAirCt: 5.216, massLiquidCt: 3.914, tempC: 21.5 });
  expect(result.densityKgM3).toBeCloseTo(3994.07, 1);
  expect(result.uDensityKgM3).toBeCloseTo(12.75, 1);
  expect(result.budget.massAir).toBeCloseTo(-3.452, 2);
  expect(result.budget.massLiquid).toBeCloseTo(12.267, 2);
});

test.each(workedOn("SG bottle (pycnometer)"))("$id: what runs out of a full bottle is what the stone displaces ($source)", ({ inputs, expected }) => {
  const displacedCt = inputs.bottle_plus_stone_outside_ct! - inputs.bottle_plus_stone_inside_ct!;
  expect(displacedCt).toBeCloseTo(expected.displaced_ct!, 9);
  const { sg } = hydrostaticDensity({ method: "beakerOnPan", massAirCt: inputs.stone_ct!, massLiquidCt: displacedCt, tempC: 4, airDensityKgM3: 0 });
  expect(sg).toBeCloseTo(expected.sg!, 3);
});

test.each(workedOn("SG determination error"))("$id: what an error of the weighing in water does ($source)", ({ inputs, expected }) => {
  const ruby = { method: "suspended" as const, massAirCt: inputs.weight_air_ct!, massLiquidCt: inputs.weight_air_ct! * (1 - 1 / 4), tempC: 4, airDensityKgM3: 0, uMassAirCt: 0, uTempC: 0 };
  expect(hydrostaticDensity({ ...ruby, uMassLiquidCt: inputs.error_water_weighing_ct! }).uSg).toBeCloseTo(expected.sg_error_approx!, 3);
});

// Worked out separately for the project's formulas, with 0.5 K of doubt: rows SG, columns carats, balances of 0.001 and 0.01 ct.
test.each([
  [2.65, 0.25, 0.115, 0.353], [2.65, 0.5, 0.058, 0.177], [2.65, 1, 0.029, 0.088], [2.65, 2, 0.014, 0.044], [2.65, 5, 0.006, 0.018], [2.65, 10, 0.003, 0.009],
  [4, 0.25, 0.266, 0.821], [4, 0.5, 0.133, 0.41], [4, 1, 0.067, 0.205], [4, 2, 0.033, 0.103], [4, 5, 0.013, 0.041], [4, 10, 0.007, 0.021],
])("SG %s at %s ct is uncertain by %s on a balance of 0.001 ct, by %s on one of 0.01 ct", (sg, massAirCt, fine, coarse) => {
  const weighing = { method: "suspended" as const, massAirCt, massLiquidCt: massAirCt * (1 - 0.99821 / sg), tempC: 20, uTempC: 0.5 };
  expect(Math.abs(hydrostaticDensity({ ...weighing, uMassAirCt: 0.0015, uMassLiquidCt: 0.004 }).uSg - fine)).toBeLessThan(0.0011);
  expect(Math.abs(hydrostaticDensity({ ...weighing, uMassAirCt: 0.006, uMassLiquidCt: 0.012 }).uSg - coarse)).toBeLessThan(0.0011);
});

test("a stone too small for its balance is said to be, with the mass that would do", () => {
  const weighing = { method: "suspended" as const, massAirCt: 0.25, massLiquidCt: 0.25 * (1 - 0.998 / 2.65), tempC: 20 };
  const result = hydrostaticDensity(weighing);
  const warning = weighingWarning({ massAirCt: 0.25, result })!;
  expect(warning).toMatch(/^Too small for this balance: the specific gravity may be anything in 2\.4\d–2\.8\d\. For ±0\.02 a stone like this would have to weigh about 1\.4 ct\.$/);
  const larger = hydrostaticDensity({ ...weighing, massAirCt: 1.44, massLiquidCt: 1.44 * (1 - 0.998 / 2.65) });
  expect(larger.uSg).toBeCloseTo(0.02, 3);
  expect(weighingWarning({ massAirCt: 1.44, result: larger })).toBeNull();
});

test("stated 95 % intervals hold the truth in 93 to 97 % of weighings of either kind", () => {
  const { even, normal } = randomFrom(88);
  const runs = 6_000;
  const held = { suspended: 0, beakerOnPan: 0 };
  for (let at = 0; at < runs; at++)
    for (const method of ["suspended", "beakerOnPan"] as const) {
      const [densityKgM3, tempC, airDensityKgM3, massCt] = [2000 + 4500 * even(), 15 + 12 * even(), 1.2, 0.8 + 8 * even()];
      const air = airDensityKgM3 + 0.02 * normal();
      // Volume in units that make the balance's own buoyancy cancel: m_a = V(ρ − ρ_air), displaced V(ρ_w − ρ_air).
      const volume = massCt / (densityKgM3 - air);
      const displacedCt = volume * (waterDensityKgM3(tempC + 0.3 * normal()) - air);
      const massAirCt = massCt + 0.0015 * normal();
      const massLiquidCt = (method === "suspended" ? massCt - displacedCt : displacedCt) + 0.004 * normal();
      const found = hydrostaticDensity({ method, massAirCt, massLiquidCt, tempC });
      if (Math.abs(found.densityKgM3 - densityKgM3) < 1.96 * found.uDensityKgM3) held[method]++;
    }
  for (const count of Object.values(held)) {
    expect(count / runs).toBeGreaterThan(0.93);
    expect(count / runs).toBeLessThan(0.97);
  }
});

// Factor 1.32 for three repeats: JCGM 100:2008, table G.2.
test("repeats are averaged, and few of them trusted less", () => {
  const { mean, u, standardDeviation } = meanOfRepeats([3.914, 3.915, 3.913], 0.004);
  expect(mean).toBeCloseTo(3.914, 9);
  expect(standardDeviation).toBeCloseTo(0.001, 9);
  expect(u).toBeCloseTo(Math.hypot((1.32 * 0.001) / Math.sqrt(3), 0.004), 9);
  expect(meanOfRepeats([5.216], 0.0015)).toEqual({ mean: 5.216, u: 0.0015, standardDeviation: null });
  expect(() => meanOfRepeats([])).toThrow(/number of values out of range/);
  expect(() => meanOfRepeats([1, Number.NaN])).toThrow(/value out of range/);
});

test("both weighing set-ups agree", () => {
  fc.assert(
    fc.property(fc.double({ min: 0.2, max: 200, noNaN: true }), fc.double({ min: 1.05, max: 8, noNaN: true }), fc.double({ min: 5, max: 35, noNaN: true }), (massAirCt, sg, tempC) => {
      const displaced = massAirCt / sg;
      const suspended = hydrostaticDensity({ method: "suspended", massAirCt, massLiquidCt: massAirCt - displaced, tempC });
      const beaker = hydrostaticDensity({ method: "beakerOnPan", massAirCt, massLiquidCt: displaced, tempC });
      expect(suspended.densityKgM3 / beaker.densityKgM3).toBeCloseTo(1, 9);
    }),
  );
});

test("the uncertainty is that of numerical differences", () => {
  const at = { method: "suspended" as const, massAirCt: 2.143, massLiquidCt: 1.608, tempC: 21.4 };
  const base = hydrostaticDensity(at);
  const step = 1e-6;
  const perAir = (hydrostaticDensity({ ...at, massAirCt: at.massAirCt + step }).densityKgM3 - base.densityKgM3) / step;
  const perLiquid = (hydrostaticDensity({ ...at, massLiquidCt: at.massLiquidCt + step }).densityKgM3 - base.densityKgM3) / step;
  expect(base.budget.massAir).toBeCloseTo(perAir * 0.0015, 2);
  expect(base.budget.massLiquid).toBeCloseTo(perLiquid * 0.004, 2);
});

test.each([
  [{ massAirCt: 1, massLiquidCt: 1 }, "massLiquidCt"],
  [{ massAirCt: 1, massLiquidCt: 2 }, "massLiquidCt"],
  [{ massAirCt: -1, massLiquidCt: 0 }, "massAirCt"],
  [{ massAirCt: Number.NaN, massLiquidCt: 0 }, "massAirCt"],
])("masses %o are refused by name", (masses, name) => {
  expect(() => hydrostaticDensity({ method: "suspended", tempC: 20, ...masses })).toThrow(new RegExp(`${name} out of range`));
});
