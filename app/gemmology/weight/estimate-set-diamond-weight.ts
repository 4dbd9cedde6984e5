import { diamondFactor, type DiamondShape } from "./diamond-factor.ts";
import { estimateFromSize } from "./estimate-from-size.ts";
import type { MeasuredStone, WeightEstimate } from "./weight-estimate.ts";

/**
 * Weight of a set diamond from its measurements.
 *
 * @returns ct, unrounded, with standard uncertainty; an estimate, and to be called so
 * @throws RangeError when an argument leaves its range
 *
 * Source: dimensions × a shape's factor (diamond-factor.ts).
 * @example estimateSetDiamondWeight({ shape: "round", lengthMm: 6.11, widthMm: 6.05, depthMm: 3.63 }).weightCt // ≈ 0.819
 */
export function estimateSetDiamondWeight({ shape, make = shape === "round" ? "precise" : "calibrated", ...stone }: MeasuredStone & Readonly<{ shape: DiamondShape }>): WeightEstimate {
  const ratio = stone.widthMm > 0 && stone.lengthMm >= stone.widthMm ? Math.min(10, stone.lengthMm / stone.widthMm) : 1;
  const { form, factorCtMm3 } = diamondFactor(shape, ratio);
  const plan = form === "meanDiameterSquared" ? "mean diameter squared" : "length × width";
  return estimateFromSize({ ...stone, make }, { name: `diamond ${shape}, ${plan} × depth × ${factorCtMm3.toPrecision(4)}, v1`, form, factorCtMm3, doubts: [] });
}
