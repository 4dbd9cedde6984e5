import fc from "fast-check";
import { expect, test } from "vitest";
import { bubbleBuoyancyCt } from "#app/gemmology/density/bubble-buoyancy-ct.ts";
import { heavyLiquidBounds, heavyLiquidLikelihood, type HeavyLiquidObservation } from "#app/gemmology/density/heavy-liquid.ts";
import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";
import { liquidDensityFromSinker } from "#app/gemmology/density/liquid-density-from-sinker.ts";
import { submergedFraction } from "#app/gemmology/density/submerged-fraction.ts";
import { wirePullCt } from "#app/gemmology/density/wire-pull-ct.ts";
import { workedOn } from "../worked-on.ts";

test.each(workedOn("heavy liquids"))("$id: $expected.behaviour in a liquid of $inputs.liquid_sg ($source)", ({ inputs, expected }) => {
  const behaviour = (expected.behaviour as unknown as string).split(" ")[0] as "floats" | "sinks";
  const [seen, other] = [{ behaviour, liquidSg: inputs.liquid_sg! }, { behaviour: behaviour === "floats" ? ("sinks" as const) : ("floats" as const), liquidSg: inputs.liquid_sg! }];
  expect(heavyLiquidLikelihood(seen, inputs.stone_sg!)).toBeCloseTo(1, 9);
  expect(heavyLiquidLikelihood(other, inputs.stone_sg!)).toBeCloseTo(0, 9);
  const { atLeast, atMost } = heavyLiquidBounds([seen]);
  expect(behaviour === "floats" ? atMost!.sg : atLeast!.sg).toBe(inputs.liquid_sg);
  expect(behaviour === "floats" ? atLeast : atMost).toBeNull();
});

test("liquids close in on a stone from both sides, and no number is made of the middle", () => {
  const tried: HeavyLiquidObservation[] = [{ behaviour: "sinks", liquidSg: 2.57 }, { behaviour: "sinks", liquidSg: 2.65 }, { behaviour: "floats", liquidSg: 3.32 }, { behaviour: "floats", liquidSg: 2.89, uLiquidSg: 0.02 }];
  expect(heavyLiquidBounds(tried)).toEqual({ atLeast: { sg: 2.65, u: 0.01 }, atMost: { sg: 2.89, u: 0.02 }, isContradictory: false });
});

test("a suspended stone is bounded on both sides by one liquid", () => {
  expect(heavyLiquidBounds([{ behaviour: "suspended", liquidSg: 2.65 }])).toEqual({ atLeast: { sg: 2.65, u: 0.01 }, atMost: { sg: 2.65, u: 0.01 }, isContradictory: false });
});

test("a stone that sinks where it should float, and floats where it should sink, contradicts itself", () => {
  expect(heavyLiquidBounds([{ behaviour: "sinks", liquidSg: 3.32 }, { behaviour: "floats", liquidSg: 2.65 }]).isContradictory).toBe(true);
  expect(heavyLiquidBounds([]).isContradictory).toBe(false);
});

test("floating and sinking are the two ends of one doubt; suspension integrates to one", () => {
  fc.assert(
    fc.property(fc.double({ min: 2, max: 4, noNaN: true }), fc.double({ min: 2, max: 4, noNaN: true }), fc.double({ min: 0.005, max: 0.2, noNaN: true }), (sg, liquidSg, uLiquidSg) => {
      const of = (behaviour: HeavyLiquidObservation["behaviour"], at: number) => heavyLiquidLikelihood({ behaviour, liquidSg, uLiquidSg }, at);
      expect(of("floats", sg) + of("sinks", sg)).toBeCloseTo(1, 6);
      expect(of("floats", sg)).toBeGreaterThanOrEqual(of("floats", sg + 0.01));
      let area = 0;
      for (let k = -400; k < 400; k++) area += of("suspended", liquidSg + (k * uLiquidSg) / 50) * (uLiquidSg / 50);
      expect(area).toBeCloseTo(1, 4);
    }),
    { numRuns: 60 },
  );
});

test.each(workedOn("liquid density from a sinker"))("$id: a liquid's density from a sinker ($source)", ({ inputs, expected }) => {
  const found = liquidDensityFromSinker({ massAirCt: inputs.mass_air_g! * 5, massLiquidCt: inputs.mass_in_liquid_g! * 5, sinkerDensityKgM3: (inputs.mass_air_g! / inputs.volume_cm3!) * 1000, airDensityKgM3: 0 });
  expect(found / 1000).toBeCloseTo(expected.liquid_density_g_cm3!, 9);
});

test("a sinker weighed in water undoes the weighing of a stone", () => {
  fc.assert(
    fc.property(fc.double({ min: 1, max: 100, noNaN: true }), fc.double({ min: 0.1, max: 0.9, noNaN: true }), fc.double({ min: 0, max: 40, noNaN: true }), (massAirCt, share, tempC) => {
      const massLiquidCt = massAirCt * share;
      const { densityKgM3 } = hydrostaticDensity({ method: "suspended", massAirCt, massLiquidCt, tempC });
      const water = liquidDensityFromSinker({ massAirCt, massLiquidCt, sinkerDensityKgM3: densityKgM3 });
      expect(water).toBeGreaterThan(992);
      expect(water).toBeLessThan(1000);
    }),
  );
});

test.each(workedOn("hydrometer / floating fraction"))("$id: a hydrometer ($source)", ({ inputs, expected }) => {
  const liquidDensityKgM3 = expected.liquid_density_kg_m3!;
  expect(submergedFraction({ bodyDensityKgM3: inputs.hydrometer_density_g_ml! * 1000, liquidDensityKgM3 })).toBeCloseTo(inputs.fraction_submerged!, 3);
});

test.each(workedOn("floating fraction"))("$id: a floating body ($source)", ({ inputs, expected }) => {
  expect(submergedFraction({ bodyDensityKgM3: inputs.body_density_kg_m3!, liquidDensityKgM3: inputs.liquid_density_kg_m3! })).toBeCloseTo(expected.fraction_submerged!, 3);
});

test("amber floats in strong brine and glass does not", () => {
  expect(submergedFraction({ bodyDensityKgM3: 1080, liquidDensityKgM3: 1190 })).toBeCloseTo(0.908, 3);
  expect(submergedFraction({ bodyDensityKgM3: 2500, liquidDensityKgM3: 1190 })).toBeNull();
});

// Volumes and forces by hand: π/6 mm³ of water is 0.523 mg, 0.0026 ct; π × 0.1 mm × 0.072 N/m is 2.3 mg of pull.
test("a bubble of a millimetre lifts 0.0026 ct, half a one an eighth of it; a wire of 0.1 mm is pulled by 2.3 mg", () => {
  expect(bubbleBuoyancyCt({ diameterMm: 1, tempC: 20 })).toBeCloseTo(0.0026, 4);
  expect(bubbleBuoyancyCt({ diameterMm: 0.5, tempC: 20 })).toBeCloseTo(0.00033, 5);
  expect(wirePullCt({ wireMm: 0.1 }) * 200).toBeCloseTo(2.31, 2);
  expect(wirePullCt({ wireMm: 0.1, share: 0.1 })).toBeCloseTo(0.0012, 4);
});

test.each([
  ["liquidSg", () => heavyLiquidBounds([{ behaviour: "floats", liquidSg: 0 }])],
  ["uLiquidSg", () => heavyLiquidLikelihood({ behaviour: "floats", liquidSg: 3, uLiquidSg: 0 }, 3)],
  ["sg", () => heavyLiquidLikelihood({ behaviour: "floats", liquidSg: 3 }, -1)],
  ["massLiquidCt", () => liquidDensityFromSinker({ massAirCt: 1, massLiquidCt: 1, sinkerDensityKgM3: 2650 })],
  ["bodyDensityKgM3", () => submergedFraction({ bodyDensityKgM3: 0, liquidDensityKgM3: 1000 })],
  ["diameterMm", () => bubbleBuoyancyCt({ diameterMm: -1, tempC: 20 })],
  ["wireMm", () => wirePullCt({ wireMm: 0 })],
])("%s outside its range is refused by name", (name, call) => {
  expect(call).toThrow(new RegExp(`^${name} out of range`));
});
