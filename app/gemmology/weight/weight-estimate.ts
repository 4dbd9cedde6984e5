import type { WeightCorrection } from "./weight-corrections.ts";

/** How evenly stones of this make keep to their shape's factor: as a relative standard uncertainty .03, .05 and .09. */
export type Make = "precise" | "calibrated" | "native";
export const makeU: Readonly<Record<Make, number>> = { precise: 0.03, calibrated: 0.05, native: 0.09 };

/** Standard uncertainty of a calliper or leverage gauge, mm (common practice). */
export const usualGaugeUMm = 0.015;
/** Of a depth that the setting hides, mm, at the least (common practice). */
export const hiddenDepthUMm = 0.2;

export type MeasuredStone = Readonly<{
  /** mm, > 0; of a round stone the larger diameter. */
  lengthMm: number;
  /** mm, in (0, lengthMm]; of a round stone the smaller diameter. */
  widthMm: number;
  /** mm, > 0; total depth. */
  depthMm: number;
  /** Standard uncertainties, mm. */
  uLengthMm?: number;
  uWidthMm?: number;
  uDepthMm?: number;
  /** Whether the setting hides the culet or the base; the depth then counts as known to 0.2 mm at best. */
  isDepthHidden?: boolean;
  make?: Make;
  corrections?: readonly WeightCorrection[];
}>;

/** A weight that was not weighed: it is always to be called an estimate, "by measurement, mounted". */
export type WeightEstimate = Readonly<{
  kind: "estimated";
  /** ct, unrounded. */
  weightCt: number;
  uWeightCt: number;
  /** Which formula, with its version: mean diameter and length × width differ by some per cent. */
  formula: string;
  /** Relative standard uncertainties that make it up, the largest first. */
  budget: readonly Readonly<{ from: string; relativeU: number }>[];
}>;
