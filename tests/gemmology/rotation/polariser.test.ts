import { expect, test } from "vitest";
import worked from "#fixtures/worked/rotation-examples.json" with { type: "json" };
import { mirrored, type Crystal } from "#app/gemmology/rotation/crystal-model.ts";
import { bestPolariser } from "#app/gemmology/rotation/decide-by.ts";
import type { PrincipalIndices } from "#app/gemmology/rotation/edge-indices.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { twinsOf } from "#app/gemmology/rotation/twins-of.ts";
import type { Vector } from "#app/gemmology/rotation/vector.ts";
import { sized } from "../../setup/torture.ts";
import { aFacet, onFacet, randomFrom } from "./a-rotation-run.ts";

const peridot: PrincipalIndices = [1.654, 1.671, 1.69];
const general = onFacet([0.7, 0.55, 0.4555]);

// Rotation, and the angle from the normal for the true and for the false crystal: an independently written solution, by
// whole degrees, whose false crystal was that of the sections.
test.each([
  ["1 ", 0, 0, 90],
  ["3 ", 0, 90, 0],
  ["5 ", 163, 1, 56],
  ["6 ", 0, 0, 90],
  ["7 ", 142, 81, 44],
  ["9 ", 0, 90, 0],
])("example %s: at %s° the polariser parts the two crystals, %s° against %s°", (which, atDeg, trueDeg, falseDeg) => {
  const example = worked.examples[Number(which) - 1]!;
  const axes = onFacet(example.normal as unknown as Vector, example.zeroTowards as unknown as Vector);
  const start = { indices: example.indices as unknown as PrincipalIndices, axes };
  const [twin] = twinsOf(start);
  const crystalOf = ({ indices, axes: own }: typeof start): Crystal => ({ rank: 3, free: indices, axes: [own] });
  const run = { facets: [{ label: "table", readings: [] }] };
  const best = bestPolariser(crystalOf(start), crystalOf(twin!), run);
  // Where the edges are just far enough apart to be used, a rotation beside it is taken.
  expect(Math.abs(best.apartDeg - Math.abs(trueDeg - falseDeg))).toBeLessThan(6);
  expect(Math.min(Math.abs(best.angleDeg - atDeg), 180 - Math.abs(best.angleDeg - atDeg))).toBeLessThanOrEqual(3);
  expect(Math.abs(best.firstDeg - trueDeg)).toBeLessThan(6);
  expect(Math.abs(best.secondDeg - falseDeg)).toBeLessThan(6);
});

test("the polariser decides whichever way round its azimuth is counted", () => {
  for (const axes of [general, mirrored(general)]) {
    const fit = fitRotation({ facets: [aFacet(peridot, axes, { u: 0.0003, polariserAtDeg: [135, 150, 165] })] });
    expect(fit.decided).toBe(true);
    expect(fit.solutions[0]!.indices).toMatchObject({ beta: expect.closeTo(1.671, 4) });
    expect(fit.outliers).toEqual([]);
  }
});

test("of hundreds of crystals that the polariser was read on, it decides for the wrong one in hardly any", () => {
  const { even, normal } = randomFrom(314);
  const runs = sized({ always: 400, whole: 5_000 });
  let [decided, wrong] = [0, 0];
  for (let turn = 0; turn < runs; turn++) {
    const alpha = 1.5 + 0.2 * even();
    const beta = alpha + 0.005 + 0.02 * even();
    const indices: PrincipalIndices = [alpha, beta, beta + 0.005 + 0.02 * even()];
    const fit = fitRotation({ facets: [aFacet(indices, onFacet([normal(), normal(), normal()]), { u: 0.0003 + 0.0005 * even(), noise: normal, polariserAtDeg: [0, 45, 90, 135] })] });
    if (!fit.decided) continue;
    decided++;
    const [best] = [...fit.solutions].sort((a, b) => a.deltaChiSquared - b.deltaChiSquared);
    const off = best && "beta" in best.indices && "alpha" in best.indices ? Math.abs(best.indices.beta - beta) / best.u.beta! : Number.POSITIVE_INFINITY;
    if (off > 5) wrong++;
  }
  expect(decided).toBeGreaterThan(0.9 * runs);
  expect(wrong / decided).toBeLessThan(0.01);
}, 120_000);

test("an azimuth that was misread is named", () => {
  const facet = aFacet(peridot, general, { u: 0.0003, polariserAtDeg: [0, 30, 60, 90, 120, 150] });
  const readings = facet.readings.map((reading) => (reading.angleDeg === 60 ? { ...reading, polariserDeg: reading.polariserDeg! + 60 } : reading));
  const { outliers } = fitRotation({ facets: [{ ...facet, readings }] });
  expect(outliers[0]!.message).toMatch(/^the polariser's azimuth at 60° doesn't fit: \d\.\d u$/);
});
