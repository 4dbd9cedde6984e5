import { requireRange } from "../require-range.ts";
import { estimateFromSize } from "./estimate-from-size.ts";
import { setStoneShapes, type SetStoneShape, type ShapeFactor } from "./set-stone-shape.ts";
import type { MeasuredStone, WeightEstimate } from "./weight-estimate.ts";

export type SetStone = MeasuredStone & Readonly<{ shape: SetStoneShape; /** Specific gravity of the identified material, in [1, 8]. */ sg: number; /** Standard uncertainty of it, ≥ 0. */ uSg?: number }>;

/**
 * Weight of a coloured stone that cannot be taken out of its setting, from its measurements.
 *
 * @returns ct, unrounded, with standard uncertainty; an estimate, and to be called so
 * @throws RangeError when an argument leaves its range
 *
 * Source: dimensions × specific gravity × a shape's factor, published tables (set-stone-shape.ts).
 * @example estimateSetStoneWeight({ shape: "round", lengthMm: 6.5, widthMm: 6.5, depthMm: 4.1, sg: 4 }).weightCt // ≈ 1.247
 */
export function estimateSetStoneWeight({ shape, sg, uSg = 0.02, ...stone }: SetStone): WeightEstimate {
  requireRange("sg", sg, sg >= 1 && sg <= 8);
  requireRange("uSg", uSg, uSg >= 0);
  const { form, factor, published }: ShapeFactor = setStoneShapes[shape];
  const relativeU = published ? Math.max(published[1] - factor, factor - published[0]) / Math.sqrt(3) / factor : 0;
  const plan = form === "meanDiameterSquared" ? "mean diameter squared" : "length × width";
  // A bead is a sphere: nothing about its make is in doubt beyond its size.
  const measured = shape === "bead" ? { make: "precise" as const, ...stone } : stone;
  return estimateFromSize(measured, {
    name: `${shape}, ${plan} × depth × ${factor.toPrecision(4)} × SG, v1`,
    form,
    factorCtMm3: factor * sg,
    doubts: [{ from: "specific gravity", relativeU: uSg / sg }, ...(relativeU > 0 ? [{ from: "published factors disagree", relativeU }] : [])],
  });
}
