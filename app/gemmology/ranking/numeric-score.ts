import { blunderShares } from "./defaults.ts";
import { normalCdf } from "../statistics/normal-cdf.ts";
import { normalPdf } from "../statistics/normal-pdf.ts";
import { softUniformCdf, softUniformDensity, softUniformSurvival, type SoftUniform } from "./soft-uniform.ts";
import type { Interval } from "../species/species-table.ts";
import type { Score } from "./term.ts";

/** Half of what is met lies near the usual value, half anywhere in the range (house value, common practice of tables that give both). */
const usualShare = 0.5;

/** Standard deviations beyond which nothing is left of a distribution. */
const farOut = 9;

/** Near the usual value with a sixth of the range as its spread. */
const usualSpread = (sigma: number, width: number) => Math.sqrt(sigma * sigma + (width * width) / 36);

export type NumericReading = Readonly<{
  value: number;
  u: number;
  range: Interval;
  /** What is met most, where that is known. */
  usual?: number | undefined;
  softness: number;
  span: number;
  /** Share of blunders among such readings; that of good ones where left out. */
  blunderShare?: number | undefined;
}>;

/**
 * A reading against a range: soft uniform ⊗ Gaussian, with a share of blunders spread over the property's span, so that a
 * single slip can never count more than ln(p·span/share).
 */
export function numericScore({ value, u, range, usual, softness, span, blunderShare = blunderShares.good }: NumericReading): Score {
  const sigma = Math.sqrt(u * u + softness * softness);
  const soft = { low: range[0], high: range[1], sigma };
  const distance = value < range[0] ? (value - range[0]) / sigma : value > range[1] ? (value - range[1]) / sigma : 0;
  // Far outside, only the blunder is left: no need to ask the tails.
  const spread = usualSpread(sigma, range[1] - range[0]);
  const isNearEven = distance <= farOut && distance >= -farOut;
  if (!isNearEven && (usual === undefined || Math.abs(value - usual) > farOut * spread)) return { logLikelihood: Math.log(blunderShare / span), tail: 0, distance };
  const even = isNearEven ? softUniformDensity(soft, value) : 0;
  const density = usual === undefined ? even : (1 - usualShare) * even + (usualShare * normalPdf((value - usual) / spread)) / spread;
  return { logLikelihood: Math.log((1 - blunderShare) * density + blunderShare / span), tail: distance === 0 ? 1 : tailOf(soft, value, usual, spread), distance };
}

/** Two-sided, of the same mixture as the density; the value lies outside the range, so that its nearer tail is known. */
function tailOf(soft: SoftUniform, value: number, usual: number | undefined, spread: number): number {
  const even = 2 * (value > soft.high ? softUniformSurvival(soft, value) : softUniformCdf(soft, value));
  return usual === undefined ? Math.min(1, even) : Math.min(1, (1 - usualShare) * even + 2 * usualShare * normalCdf(-Math.abs(value - usual) / spread));
}
