import nodes from "#fixtures/species/nodes.json" with { type: "json" };
import rowsOfFile from "#fixtures/species/species.json" with { type: "json" };
import type { SpeciesRow } from "#app/gemmology/species/species-row.ts";

/**
 * The matcher a second time, written from its specification and not from the program: straight from the files, with
 * integrals by sums and no logarithms. Slow, and for a few kinds of evidence only: two edges of a rotation, density,
 * character and sign. It leaves mixed crystals out.
 */
export type PlainEvidence = Readonly<{ low: number; high: number; sg: number; uSg: number; character: "isotropic" | "uniaxial" | "biaxial" | "anisotropic" | "aggregate"; sign: "+" | "-" }>;

const rows = new Map((rowsOfFile as unknown as SpeciesRow[]).map((row) => [row.id, row]));
type Range = Readonly<{ min: number; typ: number; max: number }>;

const gauss = (x: number, middle: number, sigma: number) => Math.exp(-0.5 * ((x - middle) / sigma) ** 2) / (sigma * Math.sqrt(2 * Math.PI));

/** Half spread evenly over the range, half about its usual value with a sixth of the range, each blurred by the reading; one reading in a hundred is a slip anywhere. */
function density(x: number, { min, typ, max }: Range, { u, soft, span }: { u: number; soft: number; span: number }): number {
  const sigma = Math.sqrt(u ** 2 + soft ** 2);
  const steps = 4_000;
  let blurred = 0;
  if (max - min < 1e-9) blurred = gauss(x, min, sigma);
  else for (let at = 0; at < steps; at++) blurred += gauss(x, min + ((at + 0.5) * (max - min)) / steps, sigma) / steps;
  const usual = gauss(x, typ, Math.sqrt(sigma ** 2 + ((max - min) / 6) ** 2));
  return 0.99 * (0.5 * blurred + 0.5 * usual) + 0.01 / span;
}

/** What crossed polars show of a kind of crystal; the specification's confusion matrix, in per mille. */
const shown: Readonly<Record<string, Readonly<Record<PlainEvidence["character"], number>>>> = {
  single: { isotropic: 800, uniaxial: 0.5, biaxial: 0.5, anisotropic: 20, aggregate: 24 },
  uniaxial: { isotropic: 20, uniaxial: 450, biaxial: 15, anisotropic: 450, aggregate: 40 },
  biaxial: { isotropic: 15, uniaxial: 15, biaxial: 450, anisotropic: 455, aggregate: 40 },
  aggregate: { isotropic: 30, uniaxial: 10, biaxial: 10, anisotropic: 100, aggregate: 800 },
};

/** Probability of the evidence under one row, and under a material that the table lacks. */
function likelihoodOf(row: SpeciesRow, evidence: PlainEvidence): number {
  const { ri } = row;
  const edges = ri?.alpha && ri.gamma ? [ri.alpha, ri.gamma] : ri?.omega && ri.epsilon ? [ri.omega, ri.epsilon].sort((a, b) => a.typ - b.typ) : ri?.n ? [ri.n, ri.n] : null;
  const index = { u: 0.0015, soft: 0.0015, span: 0.51 };
  const isOneEdge = evidence.high - evidence.low <= 2 * 0.0012;
  const ofIndex = edges ? density(evidence.low, edges[0]!, index) : ri?.spot ? density((evidence.low + evidence.high) / 2, ri.spot, index) * (isOneEdge ? 1 : 0.1) : 0.01 / 0.51;
  const gap = { u: 0.0012, soft: 0.0008, span: 0.2 };
  const ofGap = row.birefringence ? density(evidence.high - evidence.low, row.birefringence, gap) : isOneEdge ? 0.8 * density(evidence.high - evidence.low, { min: 0, typ: 0, max: 0 }, gap) : 0.2 / 0.2;
  const ofSg = row.sg ? density(evidence.sg, row.sg, { u: evidence.uSg, soft: 0.02, span: 6 }) : 1 / 6;
  const kinds = [row.optic_character].flat().map((each) => (each === "isotropic" || each === "amorphous" ? "single" : each));
  const ofCharacter = kinds.reduce((sum, each) => sum + shown[each]![evidence.character] / 1000, 0) / kinds.length;
  const ofSign = row.optic_sign === "±" ? 0.5 : row.optic_sign === evidence.sign ? 0.95 : 0.05;
  return ofIndex * ofGap * ofSg * ofCharacter * ofSign;
}

const weights = [0, 0.015, 0.05, 0.15, 0.4, 1];

/** Odds of every species against a material that the table lacks. */
export function slowOdds(evidence: PlainEvidence): Map<string, number> {
  const weightOf = ({ prevalence, kind }: SpeciesRow) => weights[prevalence]! * (kind === "composite" ? 0.25 : 1);
  const all = [...rows.values()].reduce((sum, row) => sum + weightOf(row), 0);
  const unlisted = 0.03 * (1 / 0.51) * (1 / 0.2) * (1 / 6) * 0.4 * 0.5;
  return new Map(
    nodes.map((node) => {
      const share = node.rows.map((id) => rows.get(id)!).reduce((sum, row) => sum + (0.97 * weightOf(row) * likelihoodOf(row, evidence)) / all, 0);
      return [node.id, share / unlisted];
    }),
  );
}
