import { pseudoInverse } from "../linear/pseudo-inverse.ts";
import { solve } from "../linear/solve.ts";
import { bestTurn } from "./best-turn.ts";
import { inOrder, type Crystal } from "./crystal-model.ts";
import { edgeIndices, type PrincipalIndices } from "./edge-indices.ts";
import type { Position } from "./observed.ts";
import { refine } from "./refine.ts";

type EdgeName = "upper" | "lower";

/** What one edge of one facet does over a rotation: its outer extreme is α (of the lower edge) or γ (of the upper). */
export type EdgeExtremes = Readonly<{
  outer: number;
  uOuter: number;
  /** Its other extreme, which bounds β. */
  inner: number;
  /** By reading: observed less computed, in standard uncertainties. */
  residuals: readonly number[];
  parameters: number;
}>;

/** No gem material is doubly refractive by more (rutile, 0.296): a narrower dip of an edge is a misreading. */
const strongestBirefringence = 0.3;
const degree = Math.PI / 180;
const huber = 2.5;
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const costOf = (residuals: readonly number[]) => sum(residuals.map((value) => (Math.abs(value) <= huber ? value * value : 2 * huber * Math.abs(value) - huber * huber)));

/**
 * The extremes of one edge: of the constant that fits it, of a uniaxial crystal's moving edge, and of a biaxial one's,
 * averaged by their Akaike weights, so that what is uncertain about the choice is in the uncertainty.
 *
 * Source: H. Akaike, IEEE Trans. Autom. Control 19 (1974) 716; K. P. Burnham and D. R. Anderson, Model Selection and
 * Multimodel Inference, §4.3.
 *
 * @param positions of one facet, with that edge read at each
 */
export function edgeExtremes(positions: readonly Position[], edge: EdgeName): EdgeExtremes {
  const apart = new Set(positions.map(({ angleDeg }) => Math.round((((angleDeg % 180) + 180) % 180) * 10))).size;
  const models = [fitConstant(positions, edge), ...(apart >= 4 ? [fitUniaxial(positions, edge)] : []), ...(apart >= 7 ? fitBiaxial(positions, edge) : [])];
  const criteria = models.map(({ residuals, parameters }) => costOf(residuals) + 2 * parameters);
  const least = Math.min(...criteria);
  const weights = criteria.map((criterion) => Math.exp((least - criterion) / 2));
  const whole = sum(weights);
  const average = (of: (model: EdgeExtremes) => number) => sum(models.map((model, at) => (weights[at]! * of(model)) / whole));
  const outer = average((model) => model.outer);
  const likeliest = models[criteria.indexOf(least)]!;
  return { ...likeliest, outer, uOuter: Math.sqrt(average((model) => model.uOuter ** 2 + (model.outer - outer) ** 2)), inner: average((model) => model.inner) };
}

function fitConstant(positions: readonly Position[], edge: EdgeName): EdgeExtremes {
  const { x, covariance, residuals } = robustly(positions.map((position) => ({ row: [1], value: position[edge]!, u: position.u })));
  return { outer: x[0]!, uOuter: Math.sqrt(covariance[0]![0]!), inner: x[0]!, residuals, parameters: 1 };
}

/** The moving edge of a uniaxial crystal: 1/n² holds a constant, cos 2φ and sin 2φ, exactly (formulas.md §4.2). */
function fitUniaxial(positions: readonly Position[], edge: EdgeName): EdgeExtremes {
  const { x, covariance, residuals } = robustly(positions.map((position) => ({ row: [1, Math.cos(2 * position.angleDeg * degree), Math.sin(2 * position.angleDeg * degree)], value: position[edge]! ** -2, u: (2 * position.u) / position[edge]! ** 3 })));
  const [level, c, s] = x as [number, number, number];
  const swing = Math.hypot(c, s);
  const away = edge === "lower" ? 1 : -1;
  const gradient = [1, (away * c) / (swing || 1), (away * s) / (swing || 1)];
  const variance = sum(gradient.map((left, i) => sum(gradient.map((right, j) => left * right * covariance[i]![j]!))));
  const outer = (level + away * swing) ** -0.5;
  return { outer, uOuter: (outer ** 3 / 2) * Math.sqrt(Math.max(0, variance)), inner: (level - away * swing) ** -0.5, residuals, parameters: 3 };
}

/** A biaxial crystal whose other edge is unknown: the seen one's outer extreme is still determined, its far indices hardly. */
function fitBiaxial(positions: readonly Position[], edge: EdgeName): [EdgeExtremes] | [] {
  const own = positions.map((position) => ({ ...position, facet: 0, polariserDeg: null, ...(edge === "lower" ? { upper: null } : { lower: null }) }));
  const observed = { facetCount: 1, positions: own };
  const edges = positions.map((position) => position[edge]!);
  const [least, most] = [Math.min(...edges), Math.max(...edges)];
  const [best] = [0.3, 1, 3]
    .map((share): Crystal => {
      const beyond = share * (most - least);
      const free: PrincipalIndices = edge === "lower" ? [least, most, most + beyond] : [least - beyond, least, most];
      return { rank: 3, free, axes: [bestTurn(free, own)] };
    })
    .map((start) => refine(start, observed))
    .filter(({ crystal }) => inOrder(crystal)[2] - inOrder(crystal)[0] < strongestBirefringence)
    .sort((a, b) => a.chiSquared - b.chiSquared);
  if (!best) return [];
  const { crystal, covariance, shown } = best;
  const indices = inOrder(crystal);
  const outer = edge === "lower" ? indices[0] : indices[2];
  const at = crystal.free.indexOf(outer);
  const along = Array.from({ length: 180 }, (_, angleDeg) => edgeIndices(crystal.free as PrincipalIndices, crystal.axes[0]!, angleDeg)[edge]);
  return [{ outer, uOuter: Math.sqrt(Math.max(0, covariance[at]![at]!)), inner: edge === "lower" ? Math.max(...along) : Math.min(...along), residuals: shown.residuals.map(([value]) => value!), parameters: 6 }];
}

/** Linear least squares in which a residual beyond 2.5 standard uncertainties counts by its size only (Huber). */
function robustly(rows: readonly Readonly<{ row: readonly number[]; value: number; u: number }>[]) {
  const size = rows[0]!.row.length;
  let weights = rows.map(() => 1);
  for (let round = 0; ; round++) {
    const normal = Array.from({ length: size }, (_, i) => Array.from({ length: size }, (__, j) => sum(rows.map(({ row, u }, at) => (weights[at]! * row[i]! * row[j]!) / u ** 2))));
    const x = solve(normal, Array.from({ length: size }, (_, i) => sum(rows.map(({ row, value, u }, at) => (weights[at]! * row[i]! * value) / u ** 2))));
    const residuals = rows.map(({ row, value, u }) => (value - sum(row.map((each, i) => each * x[i]!))) / u);
    const next = residuals.map((value) => (Math.abs(value) <= huber ? 1 : huber / Math.abs(value)));
    if (round === 20 || next.every((weight, at) => Math.abs(weight - weights[at]!) < 1e-6)) return { x, residuals, covariance: pseudoInverse(normal) };
    weights = next;
  }
}
