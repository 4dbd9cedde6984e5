import { expect, test } from "vitest";
import { expectedDensityU, uselessDensityU } from "#app/gemmology/density/expected-density-u.ts";
import { likelihoodInLiquid } from "#app/gemmology/density/heavy-liquid.ts";
import { estimateWeightCt, setShapes } from "#app/gemmology/weight/estimate-weight-ct.ts";
import { workedOn } from "../worked-on.ts";

// Source: the project's formulas, §8.5, table computed by an independent script.
test.each([[2.65, 0.25, 0.115, 0.353], [2.65, 1, 0.029, 0.088], [4, 0.5, 0.133, 0.41], [4, 1, 0.067, 0.205], [4, 10, 0.007, 0.021]])("a stone of %s and %s ct has its density to so much", (sg, massCt, fine, coarse) => {
  expect(expectedDensityU({ massCt, sg, uAirCt: 0.0015, uWaterCt: 0.004 })).toBeCloseTo(fine, 2);
  expect(expectedDensityU({ massCt, sg, uAirCt: 0.006, uWaterCt: 0.012 })).toBeCloseTo(coarse, 1.6);
});

test("a quarter carat is too small to be weighed in water", () => {
  expect(expectedDensityU({ massCt: 0.25, sg: 3.5, uAirCt: 0.0015, uWaterCt: 0.004 })).toBeGreaterThan(uselessDensityU);
});

test.each(workedOn("heavy liquids"))("$id: in a liquid as $source says", ({ inputs, expected }) => {
  const seen = String(expected.behaviour).split(" ")[0] as "floats" | "sinks";
  expect(likelihoodInLiquid({ sg: inputs.stone_sg!, liquidSg: inputs.liquid_sg!, seen })).toBeGreaterThan(0.999);
});

test("a stone of the liquid's own density stays where it is, or goes either way", () => {
  expect(likelihoodInLiquid({ sg: 2.65, liquidSg: 2.65, seen: "suspends" })).toBeCloseTo(1, 9);
  expect(likelihoodInLiquid({ sg: 2.65, liquidSg: 2.65, seen: "floats" })).toBeCloseTo(0.5, 6);
});

// Source: the constants as trade tables print them, named in each example.
const shapeOf = { "round faceted": "round", "oval faceted": "oval", "rectangular faceted": "rectangle", "emerald/step": "octagon", "pear or heart": "pear", marquise: "marquise" } as const;
test.each(workedOn("weight-estimation constant").map((one) => ({ ...one, cut: String(one.inputs.cut) as keyof typeof shapeOf })))("$id: the constant of a $cut stone", ({ cut, expected }) => {
  expect(estimateWeightCt({ shape: shapeOf[cut], lengthMm: 1, widthMm: 1, depthMm: 1, sg: 1 }).weightCt).toBeCloseTo(expected.k!, 5);
});

// Source: the project's formulas, §7.
test("published estimates come out, with their uncertainty", () => {
  expect(estimateWeightCt({ shape: "roundBrilliantDiamond", lengthMm: 6.11, widthMm: 6.05, depthMm: 3.63, sg: 3.52 }).weightCt).toBeCloseTo(0.819, 2);
  expect(estimateWeightCt({ shape: "oval", lengthMm: 8.02, widthMm: 6.11, depthMm: 3.98, sg: 4 }).weightCt).toBeCloseTo(1.589, 2);
  expect(estimateWeightCt({ shape: "round", lengthMm: 6.5, widthMm: 6.5, depthMm: 4.1, sg: 4, uMm: 0.05, uDepthMm: 0.1 })).toMatchObject({ weightCt: expect.closeTo(1.247, 3), u: expect.closeTo(0.072, 3) });
  expect(estimateWeightCt({ shape: "sphere", lengthMm: 10, widthMm: 10, depthMm: 10, sg: 2.7 }).weightCt).toBeCloseTo(1000 * 2.7 * 0.002618, 2);
});

test("every shape is estimated, a thick girdle weighs more, and what cannot be is refused", () => {
  for (const shape of setShapes) {
    const stone = { shape, lengthMm: 7, widthMm: 6, depthMm: 4, sg: 3.5 };
    expect(estimateWeightCt({ ...stone, girdle: "thick" }).weightCt).toBeGreaterThan(estimateWeightCt(stone).weightCt);
    expect(() => estimateWeightCt({ ...stone, depthMm: 0 })).toThrow(RangeError);
  }
});
