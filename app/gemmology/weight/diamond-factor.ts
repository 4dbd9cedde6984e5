import { requireRange } from "../require-range.ts";
import type { SizeForm } from "./set-stone-shape.ts";

export type DiamondShape = "round" | "roundOldCut" | "oval" | "triangle" | "heart" | "baguette" | "emerald" | "marquise" | "pear";

/*
 * ct/mm³ for diamond, specific gravity 3.52 within. Source: a published page of formulas for calculating the weight (read).
 * Where it gives a factor for several ratios of length to width, [ratio, factor] in rising order.
 */
const factors: Readonly<Record<DiamondShape, Readonly<{ form: SizeForm; byRatio: readonly (readonly [ratio: number, factor: number])[] }>>> = {
  round: { form: "meanDiameterSquared", byRatio: [[1, 0.0061]] },
  roundOldCut: { form: "meanDiameterSquared", byRatio: [[1, 0.0067]] },
  oval: { form: "meanDiameterSquared", byRatio: [[1, 0.0062]] },
  triangle: { form: "lengthWidth", byRatio: [[1, 0.0057]] },
  heart: { form: "lengthWidth", byRatio: [[1, 0.0059]] },
  baguette: { form: "lengthWidth", byRatio: [[1, 0.00915]] },
  emerald: { form: "lengthWidth", byRatio: [[1, 0.008], [1.5, 0.0092], [2, 0.01], [2.5, 0.0106]] },
  marquise: { form: "lengthWidth", byRatio: [[1.5, 0.00565], [2, 0.0058], [2.5, 0.00585], [3, 0.00595]] },
  pear: { form: "lengthWidth", byRatio: [[1.25, 0.00615], [1.5, 0.006], [2, 0.00575]] },
};

/**
 * Factor of a diamond's shape, interpolated between the ratios of length to width for which it is published; beyond the
 * outermost it stays.
 *
 * @param ratio length over width, in [1, 10]
 * @throws RangeError when the ratio leaves its range
 */
export function diamondFactor(shape: DiamondShape, ratio: number): Readonly<{ form: SizeForm; factorCtMm3: number }> {
  requireRange("ratio", ratio, ratio >= 1 && ratio <= 10);
  const { form, byRatio } = factors[shape];
  const above = byRatio.findIndex(([at]) => at >= ratio);
  if (above === 0) return { form, factorCtMm3: byRatio[0]![1] };
  if (above < 0) return { form, factorCtMm3: byRatio.at(-1)![1] };
  const [[low, from], [high, to]] = [byRatio[above - 1]!, byRatio[above]!];
  return { form, factorCtMm3: from + ((to - from) * (ratio - low)) / (high - low) };
}
