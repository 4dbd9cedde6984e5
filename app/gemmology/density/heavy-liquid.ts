import { requireRange } from "../require-range.ts";
import { normalCdf } from "../statistics/normal-cdf.ts";
import { normalPdf } from "../statistics/normal-pdf.ts";

/**
 * What a stone did in a liquid of known density. Heavy liquids are toxic and harm porous, organic, glued, filled and
 * coated stones: extraction, gloves and the client's consent come first, and most laboratories weigh instead.
 */
export type HeavyLiquidObservation = Readonly<{
  behaviour: "floats" | "suspended" | "sinks";
  /** Specific gravity of the liquid at its temperature, in [0.7, 5]. */
  liquidSg: number;
  /** Standard uncertainty of it, > 0; marker crystals keep it small, for warmth and evaporation move it. */
  uLiquidSg?: number;
}>;

const usualU = 0.01;

export type DensityBounds = Readonly<{
  /** Largest liquid in which the stone did not float, and its uncertainty; null where none was tried. */
  atLeast: Readonly<{ sg: number; u: number }> | null;
  atMost: Readonly<{ sg: number; u: number }> | null;
  /** Observations that cannot both be true of one stone: a liquid was wrong, or the stone is porous or assembled. */
  isContradictory: boolean;
}>;

/**
 * Bounds of a stone's specific gravity from what it did in heavy liquids. A bound is no measurement: no number is made of
 * the middle.
 *
 * @throws RangeError when a value leaves its range
 *
 * Source: Archimedes' principle. The usual uncertainty of a liquid, 0.01, is common practice.
 */
export function heavyLiquidBounds(observations: readonly HeavyLiquidObservation[]): DensityBounds {
  let [atLeast, atMost]: [DensityBounds["atLeast"], DensityBounds["atMost"]] = [null, null];
  for (const { behaviour, liquidSg: sg, uLiquidSg: u = usualU } of observations) {
    requireLiquid(sg, u);
    if (behaviour !== "floats" && (!atLeast || sg > atLeast.sg)) atLeast = { sg, u };
    if (behaviour !== "sinks" && (!atMost || sg < atMost.sg)) atMost = { sg, u };
  }
  return { atLeast, atMost, isContradictory: atLeast !== null && atMost !== null && atLeast.sg - atMost.sg > 3 * Math.hypot(atLeast.u, atMost.u) };
}

/**
 * How likely a stone of one specific gravity would have done what was seen.
 *
 * @param sg of the hypothesis, > 0
 * @returns probability for floating and sinking; for suspension a density per unit of specific gravity
 * @throws RangeError when a value leaves its range
 *
 * Source: normal error of the liquid's density; Φ((ρ_L − ρ)/u) for floating, its complement for sinking.
 */
export function heavyLiquidLikelihood({ behaviour, liquidSg, uLiquidSg = usualU }: HeavyLiquidObservation, sg: number): number {
  requireLiquid(liquidSg, uLiquidSg);
  requireRange("sg", sg, sg > 0);
  const z = (liquidSg - sg) / uLiquidSg;
  if (behaviour === "suspended") return normalPdf(z) / uLiquidSg;
  return normalCdf(behaviour === "floats" ? z : -z);
}

function requireLiquid(liquidSg: number, uLiquidSg: number): void {
  requireRange("liquidSg", liquidSg, liquidSg >= 0.7 && liquidSg <= 5);
  requireRange("uLiquidSg", uLiquidSg, uLiquidSg > 0 && uLiquidSg <= 1);
}
