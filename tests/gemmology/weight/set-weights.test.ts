import fc from "fast-check";
import { expect, test } from "vitest";
import { diamondFactor, type DiamondShape } from "#app/gemmology/weight/diamond-factor.ts";
import { estimateSetDiamondWeight } from "#app/gemmology/weight/estimate-set-diamond-weight.ts";
import { estimateSetStoneWeight } from "#app/gemmology/weight/estimate-set-stone-weight.ts";
import { setStoneShapes, type SetStoneShape, type ShapeFactor } from "#app/gemmology/weight/set-stone-shape.ts";
import { correctionConflict, weightCorrections, type WeightCorrection } from "#app/gemmology/weight/weight-corrections.ts";
import { workedOn } from "../worked-on.ts";

const cuts: Record<string, SetStoneShape[]> = { "round faceted": ["round"], "oval faceted": ["oval"], "rectangular faceted": ["rectangle"], "emerald/step": ["octagon"], "pear or heart": ["pear", "heart"], marquise: ["marquise"] };
const forms: Record<string, string> = { "D*D*depth*SG": "meanDiameterSquared", "((L+W)/2)^2*depth*SG": "meanDiameterSquared", "L*W*depth*SG": "lengthWidth" };

test.each(workedOn("weight-estimation constant"))("$id: factor of $inputs.cut ($source)", ({ inputs, expected }) => {
  const shapes = cuts[inputs.cut as unknown as string]!;
  for (const shape of shapes) {
    const { form, factor, published = [factor, factor] }: ShapeFactor = setStoneShapes[shape];
    expect(form).toBe(forms[inputs.form as unknown as string]);
    expect(expected.k!).toBeGreaterThanOrEqual(published[0]);
    expect(expected.k!).toBeLessThanOrEqual(published[1]);
  }
});

test("a round of 6.50 × 4.10 mm in corundum is estimated at 1.25 ± 0.07 ct", () => {
  const { weightCt, uWeightCt, kind } = estimateSetStoneWeight({ shape: "round", lengthMm: 6.5, widthMm: 6.5, depthMm: 4.1, uLengthMm: 0.05, uDepthMm: 0.1, sg: 4, uSg: 0.02 });
  expect(weightCt).toBeCloseTo(1.247, 3);
  expect(uWeightCt).toBeCloseTo(0.072, 3);
  expect(kind).toBe("estimated");
});

test("an oval of 8.02 × 6.11 × 3.98 mm is 1.589 ct by mean diameter, and the formula says which it was", () => {
  const { weightCt, formula } = estimateSetStoneWeight({ shape: "oval", lengthMm: 8.02, widthMm: 6.11, depthMm: 3.98, sg: 4 });
  expect(weightCt).toBeCloseTo(1.589, 3);
  expect(formula).toBe("oval, mean diameter squared × depth × 0.002000 × SG, v1");
});

test("a round diamond of 6.05–6.11 × 3.63 mm is estimated at 0.819 ct", () => {
  expect(estimateSetDiamondWeight({ shape: "round", lengthMm: 6.11, widthMm: 6.05, depthMm: 3.63 }).weightCt).toBeCloseTo(0.819, 3);
});

// Every table of the trade gives a brilliant of 6.5 mm and 60 per cent depth one carat (common practice).
test("a brilliant of 6.5 mm is a carat", () => {
  expect(estimateSetDiamondWeight({ shape: "round", lengthMm: 6.5, widthMm: 6.5, depthMm: 3.9 }).weightCt).toBeCloseTo(1, 1);
});

// Factors as the published page prints them, at its ratios and between.
test.each<[DiamondShape, number, number]>([
  ["emerald", 1, 0.008], ["emerald", 1.5, 0.0092], ["emerald", 2, 0.01], ["emerald", 2.5, 0.0106], ["emerald", 1.25, 0.0086], ["emerald", 4, 0.0106],
  ["marquise", 1.5, 0.00565], ["marquise", 2, 0.0058], ["marquise", 2.5, 0.00585], ["marquise", 3, 0.00595], ["marquise", 1.2, 0.00565],
  ["pear", 1.25, 0.00615], ["pear", 1.5, 0.006], ["pear", 2, 0.00575], ["pear", 1.75, 0.005875],
  ["round", 1, 0.0061], ["roundOldCut", 1, 0.0067], ["oval", 1.4, 0.0062], ["triangle", 1, 0.0057], ["heart", 1, 0.0059], ["baguette", 2, 0.00915],
])("a %s diamond of ratio %s has the factor %s", (shape, ratio, factor) => {
  expect(diamondFactor(shape, ratio).factorCtMm3).toBeCloseTo(factor, 8);
});

test("a bead and a cabochon are what geometry says", () => {
  const bead = estimateSetStoneWeight({ shape: "bead", lengthMm: 8, widthMm: 8, depthMm: 8, sg: 2.7 });
  expect(bead.weightCt).toBeCloseTo(((4 / 3) * Math.PI * 4 ** 3 * 2.7) / 200, 9);
  const halfEllipsoid = ((2 / 3) * Math.PI * 5 * 4 * 4 * 2.65) / 200;
  const cabochon = estimateSetStoneWeight({ shape: "cabochon", lengthMm: 10, widthMm: 8, depthMm: 4, sg: 2.65 });
  expect(Math.abs(cabochon.weightCt / halfEllipsoid - 1)).toBeLessThan(0.02);
});

/*
 * A faceted stone is fuller than the cone or pyramid on its outline and leaner than the cylinder or prism. Share of the
 * rectangle L × W that the outline fills: round, oval, cushion π/4 or more; marquise, of two arcs, at least 0.6.
 */
test.each<[SetStoneShape, number, number]>([["round", Math.PI / 4, Math.PI / 4], ["oval", Math.PI / 4, Math.PI / 4], ["square", 1, 1], ["octagon", 0.85, 1], ["rectangle", 1, 1], ["pear", 0.64, 0.75], ["marquise", 0.6, 0.7], ["heart", 0.64, 0.8], ["squareCushion", Math.PI / 4, 1], ["rectangularCushion", Math.PI / 4, 1]])("the factor of a %s lies between its pyramid's and its prism's", (shape, least, most) => {
  const { factor } = setStoneShapes[shape];
  expect(factor).toBeGreaterThan(least / 3 / 200);
  expect(factor).toBeLessThan(most / 200);
});

test("corrections multiply, and what is uncertain about them is in the budget", () => {
  const stone = { shape: "round" as const, lengthMm: 6.5, widthMm: 6.5, depthMm: 4.1, sg: 4 };
  const plain = estimateSetStoneWeight(stone);
  const thick = estimateSetStoneWeight({ ...stone, corrections: ["girdleThick", "pavilionBulge"] });
  expect(thick.weightCt / plain.weightCt).toBeCloseTo(1.03 * 1.04, 9);
  expect(thick.uWeightCt / thick.weightCt).toBeGreaterThan(plain.uWeightCt / plain.weightCt);
  expect(thick.budget.map(({ from }) => from)).toEqual(expect.arrayContaining(["plan", "depth", "make", "specific gravity", "girdleThick", "pavilionBulge"]));
  expect(estimateSetStoneWeight({ ...stone, corrections: ["girdleSlightlyThick"] }).weightCt / plain.weightCt).toBeCloseTo(1.02, 9);
  expect(estimateSetStoneWeight({ ...stone, corrections: ["shallowOrWindowed"] }).weightCt).toBeLessThan(plain.weightCt);
});

test("every correction lies between a twentieth off and the 1.18 of the deepest native cuts", () => {
  for (const [least, greatest] of Object.values(weightCorrections)) {
    expect(least).toBeGreaterThanOrEqual(0.95);
    expect(greatest).toBeLessThanOrEqual(1.18);
    expect(least).toBeLessThanOrEqual(greatest);
  }
});

test.each<[WeightCorrection[]]>([[["girdleThick", "girdleVeryThick"]], [["pavilionBulge", "deepNativeBulge"]], [["girdleThick", "girdleThick"]]])("corrections %j exclude one another", (corrections) => {
  expect(correctionConflict(corrections)).not.toBeNull();
  expect(() => estimateSetStoneWeight({ shape: "oval", lengthMm: 8, widthMm: 6, depthMm: 4, sg: 4, corrections })).toThrow(/corrections out of range/);
});

test("a hidden depth and a native cut are stated in the uncertainty", () => {
  const stone = { shape: "oval" as const, lengthMm: 8, widthMm: 6, depthMm: 4, sg: 4, uSg: 0 };
  const [open, hidden] = [estimateSetStoneWeight(stone), estimateSetStoneWeight({ ...stone, isDepthHidden: true })];
  expect(hidden.weightCt).toBe(open.weightCt);
  expect(hidden.budget.find(({ from }) => from === "depth")!.relativeU).toBeCloseTo(0.05, 9);
  expect(estimateSetStoneWeight({ ...stone, make: "native" }).budget[0]).toMatchObject({ from: "make", relativeU: 0.09 });
  expect(estimateSetDiamondWeight({ shape: "round", lengthMm: 6.5, widthMm: 6.5, depthMm: 3.9 }).budget[0]).toMatchObject({ from: "make", relativeU: 0.03 });
});

test("twice the size weighs eight times as much, and the specific gravity is a factor", () => {
  const shapes = fc.constantFrom(...(Object.keys(setStoneShapes) as SetStoneShape[]));
  fc.assert(
    fc.property(shapes, fc.double({ min: 1, max: 20, noNaN: true }), fc.double({ min: 0.3, max: 1, noNaN: true }), fc.double({ min: 0.3, max: 15, noNaN: true }), fc.double({ min: 1.1, max: 6, noNaN: true }), (shape, lengthMm, ratio, depthMm, sg) => {
      const widthMm = lengthMm * ratio;
      const one = estimateSetStoneWeight({ shape, lengthMm, widthMm, depthMm, sg });
      expect(estimateSetStoneWeight({ shape, lengthMm: 2 * lengthMm, widthMm: 2 * widthMm, depthMm: 2 * depthMm, sg }).weightCt / one.weightCt).toBeCloseTo(8, 9);
      expect(estimateSetStoneWeight({ shape, lengthMm, widthMm, depthMm, sg: sg * 1.25 }).weightCt / one.weightCt).toBeCloseTo(1.25, 9);
      expect(one.uWeightCt).toBeGreaterThan(0.02 * one.weightCt);
      expect(one.budget.map(({ relativeU }) => relativeU)).toEqual([...one.budget.map(({ relativeU }) => relativeU)].sort((a, b) => b - a));
    }),
  );
});

test.each([
  ["lengthMm", { lengthMm: 0 }],
  ["widthMm", { widthMm: 9 }],
  ["widthMm", { widthMm: Number.NaN }],
  ["depthMm", { depthMm: -1 }],
  ["sg", { sg: 0.5 }],
  ["uSg", { uSg: -1 }],
  ["uDepthMm", { uDepthMm: -1 }],
])("%s outside its range is refused by name: %o", (name, wrong) => {
  expect(() => estimateSetStoneWeight({ shape: "oval", lengthMm: 8, widthMm: 6, depthMm: 4, sg: 4, ...wrong })).toThrow(new RegExp(`^${name} out of range`));
});

test("a diamond wider than long is refused by name", () => {
  expect(() => estimateSetDiamondWeight({ shape: "pear", lengthMm: 5, widthMm: 6, depthMm: 4 })).toThrow(/widthMm out of range: 6/);
});
