import { blunderShare } from "./defaults.ts";
import { softUniformDensity, softUniformTwoSided } from "./soft-uniform.ts";
import type { Interval } from "../species/species-table.ts";
import type { Score } from "./term.ts";

/**
 * A reading against a range: soft uniform ⊗ Gaussian, with a share of blunders spread over the property's span, so that a
 * single slip can never count more than ln(p·span/share).
 */
export function numericScore({ value, u, range, softness, span }: { value: number; u: number; range: Interval; softness: number; span: number }): Score {
  const sigma = Math.sqrt(u * u + softness * softness);
  const soft = { low: range[0], high: range[1], sigma };
  const distance = value < range[0] ? (value - range[0]) / sigma : value > range[1] ? (value - range[1]) / sigma : 0;
  // Far outside, only the blunder is left: no need to ask the tails.
  const density = Math.abs(distance) > 9 ? 0 : softUniformDensity(soft, value);
  const tail = distance === 0 ? 1 : Math.abs(distance) > 9 ? 0 : softUniformTwoSided(soft, value);
  return { logLikelihood: Math.log((1 - blunderShare) * density + blunderShare / span), tail, distance };
}
