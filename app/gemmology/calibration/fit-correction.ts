import type { Correction } from "./correction.ts";

/** A reference read on an instrument: both in its unit, each with its standard uncertainty. */
export type ReferencePoint = Readonly<{ nominal: number; uNominal: number; reading: number; uReading: number }>;

export type FittedCorrection = Readonly<{
  correction: Correction;
  /** What is left at each point after the correction, in the order given. */
  residuals: readonly number[];
  /** How far the points scatter beyond their uncertainties, as a factor that those of the correction were widened by; 1: not at all. */
  widening: number;
}>;

/**
 * The correction that brings readings of references to their values, by least squares weighted with both uncertainties
 * (the weighted straight line of ISO/TS 28037 clause 6, through reading against nominal − reading). Points that scatter
 * by more than their uncertainties widen the answer's (Birge).
 *
 * @throws RangeError with no point, or for a line with fewer than two readings apart from each other
 */
export function fitCorrection(points: readonly ReferencePoint[], model: Correction["model"]): FittedCorrection {
  if (points.length === 0) throw new RangeError("a correction needs a point");
  const weighted = points.map(({ nominal, uNominal, reading, uReading }) => {
    const variance = uNominal ** 2 + uReading ** 2;
    if (!(variance > 0)) throw new RangeError("a point without uncertainty");
    return { x: reading, y: nominal - reading, weight: 1 / variance };
  });
  const total = sum(weighted.map(({ weight }) => weight));
  const centre = sum(weighted.map(({ x, weight }) => weight * x)) / total;
  const offset = sum(weighted.map(({ y, weight }) => weight * y)) / total;
  const spread = sum(weighted.map(({ x, weight }) => weight * (x - centre) ** 2));
  const isLine = model === "line";
  if (isLine && new Set(weighted.map(({ x }) => x)).size < 2) throw new RangeError("a line needs two different readings");
  const slope = isLine ? sum(weighted.map(({ x, y, weight }) => weight * (x - centre) * (y - offset))) / spread : 0;
  const residuals = weighted.map(({ x, y }) => y - offset - slope * (x - centre));
  const chiSquared = sum(weighted.map(({ weight }, at) => weight * residuals[at]! ** 2));
  const freedom = points.length - (isLine ? 2 : 1);
  const widening = freedom > 0 ? Math.max(1, Math.sqrt(chiSquared / freedom)) : 1;
  return {
    correction: { model, centre, offset, slope, uOffset: widening / Math.sqrt(total), uSlope: isLine ? widening / Math.sqrt(spread) : 0 },
    residuals,
    widening,
  };
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
