import { requireRange } from "../require-range.ts";
import { normalCdf } from "../statistics/normal-cdf.ts";
import { normalPdf } from "../statistics/normal-pdf.ts";

export type InLiquid = "floats" | "suspends" | "sinks";

/**
 * How likely a stone of some density behaves as it was seen to in a liquid: a bound, not a number.
 *
 *   floats Φ((ρ_L − ρ)/σ),   sinks Φ((ρ − ρ_L)/σ),   suspends N(ρ; ρ_L, σ)·σ√(2π)
 *
 * @param liquidSg density of the liquid at its temperature, as a marker crystal confirms it
 * @param u standard uncertainty of both together
 * @throws RangeError
 *
 * Source: Archimedes' principle with a Gaussian error. Heavy liquids are toxic; local rules come first.
 */
export function likelihoodInLiquid({ sg, liquidSg, seen, u = 0.01 }: { sg: number; liquidSg: number; seen: InLiquid; u?: number }): number {
  requireRange("sg", sg, sg > 0.5 && sg < 25);
  requireRange("liquidSg", liquidSg, liquidSg > 0.5 && liquidSg < 6);
  requireRange("u", u, u > 0);
  const z = (sg - liquidSg) / u;
  return seen === "floats" ? normalCdf(-z) : seen === "sinks" ? normalCdf(z) : normalPdf(z) * Math.sqrt(2 * Math.PI);
}
