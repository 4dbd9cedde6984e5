import fc from "fast-check";
import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { Evidence, RefractiveEvidence } from "#app/gemmology/ranking/evidence.ts";
import { logLikelihood } from "#app/gemmology/ranking/log-likelihood.ts";
import { numericScore } from "#app/gemmology/ranking/numeric-score.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { termsOf } from "#app/gemmology/ranking/terms-of.ts";
import { colourFamilies } from "#app/gemmology/species/colour-families.ts";

const { table } = loadSpeciesTable();
const node = (id: string) => table.nodes.find((each) => each.id === id)!;
const of = (id: string, evidence: Evidence) => logLikelihood(node(id), evidence);
const lineOf = (id: string, evidence: Evidence, property: string) => rankSpecies(evidence, table).candidates.find(({ speciesId }) => speciesId === id)?.evidence.find((each) => each.property === property);

test("over all colours the probabilities of a form sum to one", () => {
  for (const form of table.nodes.flatMap(({ forms }) => forms)) {
    const sum = colourFamilies.reduce((total, family) => total + Math.exp(2 * termsOf({ colour: [family] })[0]!.score(form, 0).logLikelihood), 0);
    expect(sum, form.id).toBeCloseTo(1, 9);
  }
});

test("a colour speaks for what has no other, and least for what has any", () => {
  expect(of("dioptase", { colour: ["green"] })).toBeGreaterThan(of("jadeite", { colour: ["green"] }));
  expect(of("jadeite", { colour: ["green"] })).toBeGreaterThan(of("plastic", { colour: ["green"] }));
  expect(of("plastic", { colour: ["green"] })).toBeGreaterThan(of("spodumene", { colour: ["black"] }));
});

test("words that name no colour, lustre or phenomenon say nothing", () => {
  expect(termsOf({ colour: ["nice"], lustre: "hm", transparency: "?", phenomena: ["none"] })).toEqual([]);
  expect(rankSpecies({ colour: ["grayish Purple"] }, table).candidates[0]!.evidence).toHaveLength(1);
  expect(termsOf({ phenomena: ["play-of-color"] })[0]!.score(node("opal").forms[0]!, 0).logLikelihood).toBeGreaterThan(Math.log(0.3));
});

test("what is seen never contradicts by its choice of words", () => {
  for (const { verdict } of rankSpecies({ colour: ["blue"], transparency: "opaque", lustre: "metallic" }, table).candidates.flatMap(({ evidence }) => evidence)) expect(verdict).not.toBe("contradicts");
});

test("three pleochroic colours are a biaxial stone's", () => {
  const seen = (colours: string[]): Evidence => ({ pleochroism: { strength: "strong", colours } });
  const loss = (id: string) => of(id, seen(["violet", "blue"])) - of(id, seen(["violet", "blue", "yellow"]));
  expect(loss("iolite")).toBeCloseTo(0, 9);
  expect(loss("tourmaline")).toBeGreaterThan(1);
});

test("a glow's colour counts where the table knows it", () => {
  const glow = (colour?: string): Evidence => ({ fluorescence: { longWave: { strength: "strong", ...(colour && { colour }) } } });
  expect(of("corundum", glow("red")) - of("corundum", glow("green"))).toBeGreaterThan(0.3);
  expect(of("corundum", glow())).toBeGreaterThan(of("corundum", glow("green")));
});

// Formulas §4.6: a difference of less than three uncertainties cannot be resolved.
test("one edge is no evidence against a birefringence too small to see, and is against one that shows", () => {
  const cost = (id: string, n: number) => of(id, { ri: [{ kind: "spot", n, u: 0.0015 }] }) - of(id, { ri: [{ kind: "single", n, u: 0.0015 }] });
  expect(cost("apatite", 1.635)).toBeLessThan(0.4);
  expect(cost("quartz", 1.547)).toBeGreaterThan(1.5);
  expect(cost("spinel", 1.718)).toBeCloseTo(0, 9);
});

test("two edges that coincide are one edge: an aggregate shows them as a singly refractive stone does", () => {
  const edges = (low: number, high: number): Evidence => ({ ri: [{ kind: "edges", low, high, rotated: true }] });
  expect(of("jadeite", edges(1.66, 1.66)) - of("jadeite", edges(1.655, 1.665))).toBeGreaterThan(3);
  const beside = rankSpecies({ ri: [{ kind: "edges", low: 1.66, high: 1.66, rotated: true }], opticCharacter: "aggregate", sg: { value: 3.33, u: 0.02 } }, table).candidates[0]!;
  expect(beside.speciesId).toBe("jadeite");
});

test("a poor reading allows for more blunders, so that it costs less and never contradicts", () => {
  const off = { value: 1.9, u: 0.001, range: [1.76, 1.77] as const, softness: 0.0015, span: 0.51 };
  const cost = (blunderShare: number) => -numericScore({ ...off, blunderShare }).logLikelihood;
  // ln(share/span) is all that is left far out.
  expect(cost(0.01)).toBeCloseTo(-Math.log(0.01 / 0.51), 9);
  expect(cost(0.01)).toBeGreaterThan(cost(0.03));
  expect(cost(0.03)).toBeGreaterThan(cost(0.1));
  const sg = (quality: "good" | "fair" | "poor") => lineOf("corundum", { sg: { value: 2.65, u: 0.02, quality } }, "sg")!.verdict;
  expect([sg("good"), sg("fair"), sg("poor")]).toEqual(["contradicts", "strained", "strained"]);
});

test("an interval is as likely as its part of the range, and a wide one says less than a narrow one", () => {
  const interval = (low: number, high: number): Evidence => ({ ri: [{ kind: "interval", low, high }] });
  expect(of("corundum", interval(1.7, 1.8))).toBeCloseTo(0, 1);
  expect(of("corundum", interval(1.5, 1.6))).toBeLessThan(-5);
  expect(of("spinel", interval(1.71, 1.73)) - of("spinel", interval(1.6, 1.9))).toBeLessThanOrEqual(0);
  expect(lineOf("corundum", interval(1.5, 1.6), "ri")!.verdict).toBe("contradicts");
});

test("an index by Brewster's angle reaches where the refractometer does not", () => {
  const { candidates } = rankSpecies({ ri: [{ kind: "estimate", n: 2.41, u: 0.03, by: "brewster" }, { kind: "overLimit", limit: 1.81 }], opticCharacter: "isotropic", sg: { value: 3.52, u: 0.02 } }, table);
  expect(candidates[0]).toMatchObject({ speciesId: "diamond", evidence: expect.arrayContaining([expect.objectContaining({ observed: "2.41 by Brewster’s angle" })]) });
});

// A marker of quartz at 2.65: beryl sinks, most feldspars float.
test("a heavy liquid bounds the density", () => {
  const liquid = (behaviour: "sinks" | "floats" | "suspended"): Evidence => ({ heavyLiquids: [{ behaviour, liquidSg: 2.65 }] });
  expect(of("beryl", liquid("sinks")) - of("orthoclase", liquid("sinks"))).toBeGreaterThan(2);
  expect(of("orthoclase", liquid("floats")) - of("beryl", liquid("floats"))).toBeGreaterThan(1.5);
  expect(of("quartz", liquid("suspended"))).toBeGreaterThan(of("beryl", liquid("suspended")));
  expect(lineOf("corundum", liquid("floats"), "heavyLiquid")).toMatchObject({ verdict: "contradicts", observed: "floats in 2.65", because: expect.stringMatching(/^it would sink/) });
  // Two liquids are one kind of evidence: they cannot take a species out between them.
  expect(rankSpecies({ heavyLiquids: [...liquid("floats").heavyLiquids!, { behaviour: "floats", liquidSg: 3.05 }] }, table).contradicted).toEqual([]);
});

test("iron and manganese answer the magnet", () => {
  expect(of("garnet-almandine", { magnetic: "strong" })).toBeGreaterThan(of("corundum", { magnetic: "strong" }));
  expect(of("garnet-almandine", { magnetic: "inert" })).toBeLessThan(of("corundum", { magnetic: "inert" }));
});

test("two readings that are off together are likelier than two that are off apart: one instrument, one error", () => {
  const pair = (a: number, b: number): Evidence => ({ ri: [a, b].map((n): RefractiveEvidence => ({ kind: "single", n, u: 0.0004 })) });
  const spinel = (evidence: Evidence) => Math.log(rankSpecies(evidence, table).candidates.find(({ speciesId }) => speciesId === "spinel")!.probability) - Math.log(rankSpecies(evidence, table).unlisted);
  const [low, high] = node("spinel").forms.find(({ id }) => id === "spinel-red")!.lowIndex!;
  expect(spinel(pair(low - 0.003, low - 0.003))).toBeGreaterThan(spinel(pair(low - 0.003, high + 0.003)) - 1e-9);
});

test("a mixed crystal keeps its composition when a reading beside it is far out", () => {
  const garnet: Evidence = { ri: [{ kind: "single", n: 1.744, u: 0.001 }], sg: { value: 3.94, u: 0.01 } };
  const odds = (evidence: Evidence) => {
    const { candidates, unlisted } = rankSpecies(evidence, table);
    return Math.log(candidates.find(({ speciesId }) => speciesId === "garnet-pyrope-almandine")!.probability / unlisted);
  };
  expect(odds({ ...garnet, birefringence: { value: 0.05 } })).toBeLessThan(odds(garnet));
});

const extra = fc.record<Evidence>(
  {
    ri: fc.array(
      fc.oneof<fc.Arbitrary<RefractiveEvidence>[]>(
        fc.record({ kind: fc.constant("single" as const), n: fc.double({ min: 1.4, max: 1.8, noNaN: true }), quality: fc.constantFrom("good", "fair", "poor") }),
        fc.tuple(fc.double({ min: 1.4, max: 1.75, noNaN: true }), fc.double({ min: 0, max: 0.1, noNaN: true })).map(([low, width]) => ({ kind: "interval" as const, low, high: low + width })),
        fc.record({ kind: fc.constant("estimate" as const), n: fc.double({ min: 1.4, max: 2.6, noNaN: true }), u: fc.double({ min: 0.005, max: 0.1, noNaN: true }), by: fc.constant("depth" as const) }),
        fc.tuple(fc.double({ min: 1.4, max: 1.75, noNaN: true }), fc.double({ min: 0, max: 0.03, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true })).map(([alpha, gap, share]) => ({
          kind: "rotation" as const,
          solutions: [share, 1 - share].map((each) => ({ indices: { alpha, beta: alpha + gap * each, gamma: alpha + gap }, u: 0.0006, weight: 1 + each })),
        })),
      ),
      { maxLength: 3 },
    ),
    sg: fc.record({ value: fc.double({ min: 1, max: 6, noNaN: true }), u: fc.double({ min: 0.005, max: 0.1, noNaN: true }) }),
    heavyLiquids: fc.array(fc.record({ behaviour: fc.constantFrom("floats" as const, "suspended" as const, "sinks" as const), liquidSg: fc.double({ min: 2, max: 4, noNaN: true }) }), { maxLength: 2 }),
    colour: fc.array(fc.constantFrom(...colourFamilies), { maxLength: 2 }),
    absorption: fc.array(fc.record({ nm: fc.integer({ min: 400, max: 700 }), kind: fc.constantFrom("line" as const, "band" as const) }), { maxLength: 6 }),
    phenomena: fc.subarray(["asterism", "colour change"]),
    magnetic: fc.constantFrom("inert" as const, "strong" as const),
  },
  { requiredKeys: [] },
);
const reversed = (evidence: Evidence): Evidence => Object.fromEntries(Object.entries(evidence).map(([key, value]) => [key, Array.isArray(value) ? [...(value as unknown[])].reverse() : value]));

test("with every kind of evidence, probabilities are numbers that sum to one, and order changes nothing", () => {
  fc.assert(
    fc.property(extra, (evidence) => {
      const ranking = rankSpecies(evidence, table);
      for (const { probability } of ranking.candidates) expect(probability).toBeGreaterThanOrEqual(0);
      expect(ranking.candidates.reduce((sum, { probability }) => sum + probability, ranking.unlisted)).toBeCloseTo(1, 9);
      expect(rankSpecies(reversed(evidence), table)).toEqual(ranking);
      const scores = ranking.candidates.map(({ probability, speciesId }) => ({ probability, speciesId }));
      expect([...scores].sort((a, b) => b.probability - a.probability || (a.speciesId < b.speciesId ? -1 : 1))).toEqual(scores);
    }),
    { numRuns: 40, seed: 5 },
  );
});

test("an observation that contradicts a species never raises it beside an unlisted material", () => {
  const contradictions = fc.oneof<fc.Arbitrary<Evidence>[]>(
    fc.record({ birefringence: fc.record({ value: fc.double({ min: 0, max: 0.15, noNaN: true }) }) }),
    fc.record({ sg: fc.record({ value: fc.double({ min: 1, max: 7, noNaN: true }), u: fc.double({ min: 0.005, max: 0.05, noNaN: true }) }) }),
    fc.record({ opticCharacter: fc.constantFrom("isotropic", "uniaxial", "biaxial", "aggregate") }),
    fc.record({ thermal: fc.constantFrom("diamond-like", "inert") }),
  );
  const first = fc.record({ ri: fc.tuple(fc.record({ kind: fc.constant("single" as const), n: fc.double({ min: 1.45, max: 1.8, noNaN: true }), u: fc.constantFrom(0.001, 0.003) })) });
  fc.assert(
    fc.property(first, contradictions, (before, added) => {
      const [one, both] = [rankSpecies(before, table), rankSpecies({ ...before, ...added }, table)];
      const odds = ({ candidates, unlisted }: typeof one) => new Map(candidates.map(({ speciesId, probability }) => [speciesId, Math.log(probability) - Math.log(unlisted)]));
      const [was, is] = [odds(one), odds(both)];
      const property = Object.keys(added)[0]!;
      for (const { speciesId, evidence } of both.candidates) {
        if (evidence.find((line) => line.property === property)!.verdict === "contradicts") expect(is.get(speciesId), speciesId).toBeLessThanOrEqual(was.get(speciesId)! + 1e-9);
      }
    }),
    { numRuns: 80, seed: 6 },
  );
});
