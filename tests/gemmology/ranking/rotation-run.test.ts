import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { RefractiveEvidence } from "#app/gemmology/ranking/evidence.ts";
import { logLikelihood } from "#app/gemmology/ranking/log-likelihood.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { rotationEvidence } from "#app/gemmology/ranking/rotation-evidence.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { aFacet, onFacet, randomFrom } from "../rotation/a-rotation-run.ts";

const { table } = loadSpeciesTable();
const node = (id: string) => table.nodes.find((each) => each.id === id)!;
const of = (id: string, ...ri: RefractiveEvidence[]) => logLikelihood(node(id), { ri });
const rotation = (...solutions: Extract<RefractiveEvidence, { kind: "rotation" }>["solutions"]): RefractiveEvidence => ({ kind: "rotation", solutions });
const first = (ri: RefractiveEvidence) => rankSpecies({ ri: [ri] }, table).candidates[0]!;

// The two crystals of one facet of topaz 1.610, 1.613, 1.620 (general facet, rotation-examples.json): β = 1.6130 or 1.6148.
const topaz = { indices: { alpha: 1.61, beta: 1.613, gamma: 1.62 }, u: 0.0006 };
const twin = { indices: { alpha: 1.61, beta: 1.6148, gamma: 1.62 }, u: 0.0006 };

test("both crystals of an undecided run count, half each: their mixture lies between them", () => {
  const [one, other, both] = [of("topaz", rotation(topaz)), of("topaz", rotation(twin)), of("topaz", rotation(topaz, twin))];
  expect(Math.exp(both)).toBeCloseTo((Math.exp(one) + Math.exp(other)) / 2, 6);
  expect(one).toBeGreaterThan(other);
  expect(rankSpecies({ ri: [rotation(twin, topaz)] }, table)).toEqual(rankSpecies({ ri: [rotation(topaz, twin)] }, table));
});

test("a crystal that fits better weighs more", () => {
  expect(of("topaz", rotation({ ...topaz, weight: 3 }, { ...twin, weight: 1 }))).toBeGreaterThan(of("topaz", rotation(topaz, twin)));
  expect(of("topaz", rotation({ ...topaz, weight: 3 }, { ...twin, weight: 1 }))).toBeCloseTo(of("topaz", rotation({ ...topaz, weight: 6 }, { ...twin, weight: 2 })), 12);
});

test("where β stands parts species of the same indices", () => {
  // Quartz has β at its least index; a feldspar of much the same indices has it between.
  const quartz = rotation({ indices: { omega: 1.5443, epsilon: 1.5534 }, u: 0.0006 });
  expect(of("quartz", quartz) - of("feldspar-oligoclase-sunstone", quartz)).toBeGreaterThan(3);
  expect(first(quartz).speciesId).toBe("quartz");
});

test("a uniaxial stone's single facet leaves a biaxial twin, and the uniaxial species ahead", () => {
  const { normal } = randomFrom(11);
  // Tourmaline 1.640, 1.620, c at 60° to the facet's normal.
  const facet = aFacet([1.62, 1.64, 1.64], onFacet([0.5, 0.6, Math.sqrt(1 - 0.61)]), { noise: normal });
  const evidence = rotationEvidence(fitRotation({ facets: [facet] }))!;
  expect(evidence.kind).toBe("rotation");
  expect(rankSpecies({ ri: [evidence], sg: { value: 3.06, u: 0.02 } }, table).candidates[0]!.speciesId).toBe("tourmaline");
});

test("a run on glass shows one index and no second edge", () => {
  const facet = { label: "table", readings: Array.from({ length: 12 }, (_, at) => ({ angleDeg: at * 15, upper: 1.52, lower: 1.52, u: 0.0005, polariserDeg: null })) };
  const evidence = rotationEvidence(fitRotation({ facets: [facet] }))!;
  const { candidates } = rankSpecies({ ri: [evidence] }, table);
  expect(candidates[0]!.speciesId).toBe("glass");
  expect(candidates[0]!.evidence[0]!.observed).toBe("1.520 over a rotation");
  expect(candidates.find(({ speciesId }) => speciesId === "orthoclase")?.evidence[0]!.verdict ?? "contradicts").toBe("contradicts");
});

test("a run that was never fitted says nothing; one that showed an edge alone is a single reading", () => {
  expect(rotationEvidence({ solutions: [] })).toBeNull();
  expect(rotationEvidence({ solutions: [{ character: "undetermined", sign: null, indices: { alpha: 1.762 }, u: { alpha: 0.0004 }, birefringence: null, twoVDeg: null, orientation: [], rms: 0, deltaChiSquared: 0 }] })).toEqual({ kind: "single", n: 1.762, u: expect.closeTo(0.0008, 4) });
});
