import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { sized } from "../../setup/torture.ts";
import { randomFrom } from "../rotation/a-rotation-run.ts";
import { slowOdds, type PlainEvidence } from "./slow-oracle.ts";

const { table } = loadSpeciesTable();
const isMixed = new Map(table.nodes.map(({ id, forms }) => [id, forms.some(({ isSeries }) => isSeries)]));
const { even } = randomFrom(77);

/** Readings near some species, so that the odds are not all of slips. */
function evidenceNear(): PlainEvidence {
  const node = table.nodes[Math.floor(even() * table.nodes.length)]!;
  const { lowIndex, spotIndex, sg, birefringence } = node.forms[0]!;
  const within = (range: readonly [number, number] | null, otherwise: number, margin: number) => (range ? range[0] + even() * (range[1] - range[0]) : otherwise) + (even() - 0.5) * margin;
  const low = Math.min(1.8, within(lowIndex ?? spotIndex, 1.6, 0.006));
  const one = <T>(all: readonly T[]) => all[Math.floor(even() * all.length)]!;
  return { low, high: low + Math.max(0, within(birefringence, 0.01, 0.004)), sg: Math.max(0.6, within(sg, 3, 0.1)), uSg: one([0.01, 0.03, 0.1]), character: one(["isotropic", "uniaxial", "biaxial", "anisotropic", "aggregate"]), sign: one(["+", "-"]) };
}

test("a second, slow matcher, written from the specification, gives every species the same odds", { timeout: 600_000 }, () => {
  let compared = 0;
  for (let at = 0; at < sized({ always: 25, whole: 1_000 }); at++) {
    const evidence = evidenceNear();
    const slow = slowOdds(evidence);
    const { candidates, unlisted } = rankSpecies({ ri: [{ kind: "edges", low: evidence.low, high: evidence.high, rotated: true }], sg: { value: evidence.sg, u: evidence.uSg }, opticCharacter: evidence.character, opticSign: evidence.sign }, table);
    for (const { speciesId, probability } of candidates) {
      if (isMixed.get(speciesId)) continue;
      compared++;
      expect(Math.log(probability / unlisted), `${speciesId} with ${JSON.stringify(evidence)}`).toBeCloseTo(Math.log(slow.get(speciesId)!), 2);
    }
  }
  expect(compared).toBeGreaterThan(500);
});
