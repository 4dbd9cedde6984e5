import { expect, test } from "vitest";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { AbsorptionSeen, Evidence } from "#app/gemmology/ranking/evidence.ts";
import { logLikelihood } from "#app/gemmology/ranking/log-likelihood.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";

const { table } = loadSpeciesTable();
const node = (id: string) => table.nodes.find((each) => each.id === id)!;
const lines = (...nms: number[]): AbsorptionSeen[] => nms.map((nm) => ({ nm, kind: "line" }));
/** How much a spectrum speaks for one species beside another, natural logarithm. */
const odds = (first: string, second: string, evidence: Evidence) => logLikelihood(node(first), evidence) - logLikelihood(node(second), evidence);

// Lines as gemmological textbooks teach them (common practice): almandine 505, 527, 576; peridot 453, 473, 493; ruby 694, 668, 659, 476, 468.
test.each([
  ["almandine's three bands", lines(505, 527, 576), "garnet-almandine", "corundum"],
  ["peridot's three bands", lines(453, 473, 493), "peridot", "epidote"],
  ["ruby's chromium lines", lines(694, 668, 476, 468), "corundum", "garnet-almandine"],
  ["high zircon’s line at 653.5", lines(653.5), "zircon-high", "garnet-almandine"],
] as const)("%s speak for it", (_what, absorption, first, second) => {
  expect(odds(first, second, { absorption })).toBeGreaterThan(2);
});

test("a line that was expected and not seen counts against, the stronger the line the more", () => {
  const whole = odds("garnet-almandine", "corundum", { absorption: lines(505, 527, 576) });
  const part = odds("garnet-almandine", "corundum", { absorption: lines(505) });
  expect(part).toBeLessThan(whole);
  const { lineOf, absorption } = reasonOf("garnet-almandine", { absorption: lines(505) });
  expect(lineOf).toMatch(/seen as expected: 505; expected and not seen: .*576/);
  expect(absorption).toBe("505");
});

test("no spectrum is little evidence: a factor of three at most", () => {
  const none = { absorption: [] };
  for (const id of ["corundum", "garnet-almandine", "peridot"]) expect(Math.abs(odds(id, "quartz", none)), id).toBeLessThan(Math.log(3));
  expect(reasonOf("peridot", none).absorption).toBe("no lines");
});

test("a line is looked for within what the instrument tells", () => {
  const at = (nm: number, u?: number) => odds("zircon-high", "quartz", { absorption: [{ nm, kind: "line", ...(u && { u }) }] });
  // A prism reads the red to 3 nm, a digital instrument to 0.6.
  expect(at(657)).toBeGreaterThan(at(657, 0.6));
  expect(at(653.5, 0.6)).toBeGreaterThan(at(653.5));
  expect(at(600)).toBeLessThan(0.1);
});

test("what nothing explains is told as such", () => {
  expect(reasonOf("garnet-almandine", { absorption: lines(505, 527, 576, 610) }).lineOf).toMatch(/not known of it: 610/);
  expect(reasonOf("quartz", { absorption: lines(505) }).lineOf).toMatch(/no lines are known of it|not known of it: 505/);
});

test("a pale stone need not show its lines; lines of a variety in another colour count less", () => {
  const unseen = (colour: string) => odds("peridot", "quartz", { absorption: lines(493), colour: [colour] }) - odds("peridot", "quartz", { colour: [colour] });
  expect(unseen("pale green")).not.toBe(unseen("green"));
  const chrome = (colour: string) => logLikelihood(node("jadeite"), { absorption: lines(690, 655, 630), colour: [colour] }) - logLikelihood(node("jadeite"), { colour: [colour] });
  expect(chrome("green")).toBeGreaterThan(chrome("lavender"));
});

function reasonOf(speciesId: string, evidence: Evidence): { lineOf: string; absorption: string } {
  const line = rankSpecies(evidence, table).candidates.find((each) => each.speciesId === speciesId)!.evidence.find(({ property }) => property === "absorption")!;
  return { lineOf: line.because, absorption: line.observed };
}
