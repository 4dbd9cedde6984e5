import fc from "fast-check";
import { expect, test } from "vitest";
import handbook from "#fixtures/worked/handbook-optics.json" with { type: "json" };
import speciesRows from "#fixtures/species/species.json" with { type: "json" };
import { apparentOpticAngleDeg } from "#app/gemmology/optics/apparent-optic-angle-deg.ts";
import { birefringenceFromDoubling } from "#app/gemmology/optics/birefringence-from-doubling.ts";
import { doublingAtDepth } from "#app/gemmology/optics/doubling-at-depth.ts";
import { opticAngle } from "#app/gemmology/optics/optic-angle.ts";
import { walkOffDeg } from "#app/gemmology/optics/walk-off-deg.ts";
import { sectionIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { randomFrom } from "../rotation/a-rotation-run.ts";

// Worked out separately for the project's formulas. Calcite's 6.2° is in every optics textbook.
test.each([
  ["calcite", 1.6584, 1.4864, 6.26, 0.439, true],
  ["zircon", 1.925, 1.984, 1.73, 0.121, true],
  ["peridot", 1.654, 1.69, 1.23, 0.086, true],
  ["tourmaline", 1.64, 1.62, 0.7, 0.049, true],
  ["quartz", 1.5443, 1.5534, 0.34, 0.024, true],
])("%s splits light by its angle and doubles a back edge through 4 mm", (_, omega, epsilon, deg, mm, isSeen) => {
  expect(walkOffDeg({ omega, epsilon })).toBeCloseTo(deg, 2);
  const doubling = doublingAtDepth({ omega, epsilon, depthMm: 4 });
  expect(doubling.separationMm).toBeCloseTo(mm, 3);
  expect(doubling.isSeen).toBe(isSeen);
});

test("without a loupe quartz does not double, nor any stone along its axis", () => {
  expect(doublingAtDepth({ omega: 1.5443, epsilon: 1.5534, depthMm: 4, magnification: 1 }).isSeen).toBe(false);
  expect(doublingAtDepth({ omega: 1.925, epsilon: 1.984, fromAxisDeg: 0, depthMm: 4, magnification: 40 })).toEqual({ separationMm: 0, isSeen: false });
});

test("the split is the slope of the index surface, and no direction splits more than the largest", () => {
  fc.assert(
    fc.property(fc.double({ min: 1.4, max: 2.7, noNaN: true }), fc.double({ min: -0.2, max: 0.3, noNaN: true }), fc.double({ min: 1, max: 89, noNaN: true }), (omega, gap, fromAxisDeg) => {
      const epsilon = omega + gap;
      if (Math.abs(gap) < 1e-3) return;
      const extraordinary = (deg: number) => {
        const theta = (deg * Math.PI) / 180;
        const both = sectionIndices([omega, omega, epsilon], [Math.sin(theta), 0, Math.cos(theta)]);
        return gap > 0 ? both[0] : both[1];
      };
      const slope = (extraordinary(fromAxisDeg + 0.01) - extraordinary(fromAxisDeg - 0.01)) / ((0.02 * Math.PI) / 180) / extraordinary(fromAxisDeg);
      const split = walkOffDeg({ omega, epsilon, fromAxisDeg });
      expect(Math.tan((split * Math.PI) / 180)).toBeCloseTo(Math.abs(slope), 6);
      expect(split).toBeLessThanOrEqual(walkOffDeg({ omega, epsilon }) + 1e-9);
      // A doubling is never more than the birefringence allows.
      const separationMm = doublingAtDepth({ omega, epsilon, fromAxisDeg, depthMm: 3 }).separationMm;
      expect(birefringenceFromDoubling({ n: Math.min(omega, epsilon), separationMm, depthMm: 3 }).atLeast).toBeLessThanOrEqual(Math.abs(gap) + 1e-9);
    }),
  );
});

// tan² V_z = (1/α² − 1/β²)/(1/β² − 1/γ²), worked out separately for the project's formulas.
test.each([
  ["topaz", 1.61, 1.613, 1.62, 66.7, "+"],
  ["peridot", 1.654, 1.671, 1.69, 87.7, "+"],
  ["chrysoberyl", 1.746, 1.748, 1.755, 56.4, "+"],
  ["andalusite", 1.634, 1.639, 1.643, 83.4, "-"],
  ["kornerupine", 1.668, 1.679, 1.682, 54.9, "-"],
  ["kyanite", 1.716, 1.724, 1.731, 85.8, "-"],
] as const)("%s: acute 2V and sign", (_, alpha, beta, gamma, acuteDeg, sign) => {
  const found = opticAngle({ alpha, beta, gamma });
  expect(found.acuteDeg).toBeCloseTo(acuteDeg, 1);
  expect(found.sign).toBe(sign);
});

const independent = (u: number) => [[u * u, 0, 0], [0, u * u, 0], [0, 0, u * u]];

test("a thousandth of doubt in each index leaves topaz ± 16° and peridot ± 4°, whose sign stays open", () => {
  expect(opticAngle({ alpha: 1.61, beta: 1.613, gamma: 1.62, covariance: independent(0.001) }).uDeg).toBeCloseTo(15.8, 0);
  const peridot = opticAngle({ alpha: 1.654, beta: 1.671, gamma: 1.69, covariance: independent(0.001) });
  expect(peridot.uDeg).toBeCloseTo(3.9, 1);
  expect(peridot.sign).toBeNull();
});

test("equal gaps are negative, however often a rule of thumb says otherwise", () => {
  expect(opticAngle({ alpha: 1.65, beta: 1.66, gamma: 1.67 }).sign).toBe("-");
});

test("the stated range of 2V holds the truth in 95 % of noisy indices, near 0° and 180° as well", () => {
  const { even, normal } = randomFrom(73);
  let [held, wrongSign] = [0, 0];
  const runs = 6_000;
  for (let at = 0; at < runs; at++) {
    const u = 0.0002 + 0.0004 * even();
    const share = even();
    const width = 0.006 + 0.03 * even();
    const [alpha, gamma] = [1.6, 1.6 + width];
    const beta = alpha + share * width;
    const truth = opticAngle({ alpha, beta, gamma });
    const read = [alpha + u * normal(), beta + u * normal(), gamma + u * normal()].sort((a, b) => a - b) as [number, number, number];
    const found = opticAngle({ alpha: read[0], beta: read[1], gamma: read[2], covariance: independent(u) });
    if (truth.twoVDeg >= found.rangeDeg[0] && truth.twoVDeg <= found.rangeDeg[1]) held++;
    if (found.sign !== null && found.sign !== truth.sign) wrongSign++;
  }
  expect(held / runs).toBeGreaterThan(0.93);
  expect(held / runs).toBeLessThan(0.97);
  expect(wrongSign / runs).toBeLessThan(0.025);
});

test("the apparent angle in air follows from β, and some optic axes never leave the stone", () => {
  expect(apparentOpticAngleDeg({ twoVDeg: 66.7, beta: 1.613 })).toBeCloseTo((2 * Math.asin(1.613 * Math.sin((33.35 * Math.PI) / 180)) * 180) / Math.PI, 9);
  expect(apparentOpticAngleDeg({ twoVDeg: 87.7, beta: 1.671 })).toBeNull();
});

type Row = { id: string; property: string; low: number; high: number; source: string };
const books = handbook as readonly Row[];
const angles = books.filter(({ property }) => property === "two_v");

/** The least and largest acute 2V that three ranges of indices allow. */
function allowed(ranges: readonly (readonly [number, number])[]): [number, number] {
  const values: number[] = [];
  const steps = (at: number) => Array.from({ length: 9 }, (_, k) => ranges[at]![0] + (k / 8) * (ranges[at]![1] - ranges[at]![0]));
  for (const alpha of steps(0)) for (const beta of steps(1)) for (const gamma of steps(2)) if (alpha < beta && beta < gamma) values.push(opticAngle({ alpha, beta, gamma }).acuteDeg);
  return [Math.min(...values), Math.max(...values)];
}

test.each(angles)("$id: 2V of $low–$high° is one that its indices allow ($source)", ({ id, low, high, source }) => {
  const beside = (property: string) => books.find((row) => row.id === id && row.source === source && row.property === property);
  const own = (speciesRows as unknown as { id: string; ri: Record<string, { min: number; max: number }> }[]).find((row) => row.id === id)!.ri;
  // A source that prints no β is held against ours.
  const range = (name: "alpha" | "beta" | "gamma"): [number, number] => {
    const row = beside(`ri_${name}`) ?? beside({ alpha: "ri_least", beta: "-", gamma: "ri_greatest" }[name]);
    return row && row.low < row.high ? [row.low, row.high] : [own[name]!.min, own[name]!.max];
  };
  const [least, most] = allowed([range("alpha"), range("beta"), range("gamma")]);
  expect(least).toBeLessThanOrEqual(high);
  expect(most).toBeGreaterThanOrEqual(low);
});

test("no printed optic angle was skipped", () => {
  expect(angles).toHaveLength(4);
});

test.each([
  ["indices out of order", () => opticAngle({ alpha: 1.62, beta: 1.61, gamma: 1.63 })],
  ["indices out of order", () => opticAngle({ alpha: 1.62, beta: 1.62, gamma: 1.62 })],
  ["covariance out of range", () => opticAngle({ alpha: 1.61, beta: 1.613, gamma: 1.62, covariance: [[0]] })],
  ["omega out of range", () => walkOffDeg({ omega: 0.9, epsilon: 1.5 })],
  ["fromAxisDeg out of range", () => walkOffDeg({ omega: 1.5, epsilon: 1.6, fromAxisDeg: 91 })],
  ["depthMm out of range", () => doublingAtDepth({ omega: 1.5, epsilon: 1.6, depthMm: 0 })],
  ["magnification out of range", () => doublingAtDepth({ omega: 1.5, epsilon: 1.6, depthMm: 1, magnification: 0 })],
  ["separationMm out of range", () => birefringenceFromDoubling({ n: 1.5, separationMm: -0.1, depthMm: 1 })],
  ["twoVDeg out of range", () => apparentOpticAngleDeg({ twoVDeg: 0, beta: 1.6 })],
])("%s is a RangeError that says so", (message, call) => {
  expect(call).toThrow(RangeError);
  expect(call).toThrow(message);
});
