import { requireRange } from "../require-range.ts";
import { middleOfRange } from "./middle-of-range.ts";
import type { SizeForm } from "./set-stone-shape.ts";
import { correctionConflict, weightCorrections } from "./weight-corrections.ts";
import { hiddenDepthUMm, makeU, usualGaugeUMm, type MeasuredStone, type WeightEstimate } from "./weight-estimate.ts";

/** What a shape's formula brings: the factor (ct/mm³, specific gravity within) and what is uncertain about it. */
export type SizeFormula = Readonly<{ name: string; form: SizeForm; factorCtMm3: number; doubts: readonly Readonly<{ from: string; relativeU: number }>[] }>;

/**
 * Weight by a formula of the form factor × plan × depth × corrections.
 *
 * @throws RangeError when a measurement leaves its range, or corrections exclude one another
 *
 * Source: propagation of a product by JCGM 100:2008, 5.1.6.
 */
export function estimateFromSize(
  { lengthMm, widthMm, depthMm, uLengthMm = usualGaugeUMm, uWidthMm = uLengthMm, uDepthMm = usualGaugeUMm, isDepthHidden = false, make = "calibrated", corrections = [] }: MeasuredStone,
  { name, form, factorCtMm3, doubts }: SizeFormula,
): WeightEstimate {
  requireRange("lengthMm", lengthMm, lengthMm > 0 && lengthMm <= 1000);
  requireRange("widthMm", widthMm, widthMm > 0 && widthMm <= lengthMm);
  requireRange("depthMm", depthMm, depthMm > 0 && depthMm <= 1000);
  for (const [each, value] of Object.entries({ uLengthMm, uWidthMm, uDepthMm })) requireRange(each, value, value >= 0);
  const conflict = correctionConflict(corrections);
  if (conflict) throw new RangeError(`corrections out of range: ${conflict}`);

  const mean = (lengthMm + widthMm) / 2;
  const plan = form === "meanDiameterSquared" ? mean ** 2 : lengthMm * widthMm;
  // A round stone has one diameter, twice in the product; its two readings share their error.
  const relativePlan = form === "meanDiameterSquared" ? (uLengthMm + uWidthMm) / mean : Math.hypot(uLengthMm / lengthMm, uWidthMm / widthMm);
  const depthU = isDepthHidden ? Math.max(hiddenDepthUMm, uDepthMm) : uDepthMm;
  const corrected = corrections.map((from) => {
    const [least, greatest] = weightCorrections[from];
    return { from, ...middleOfRange(least, greatest) };
  });
  const budget = [
    { from: "plan", relativeU: relativePlan },
    { from: "depth", relativeU: depthU / depthMm },
    { from: "make", relativeU: makeU[make] },
    ...doubts,
    ...corrected.map(({ from, relativeU }) => ({ from, relativeU })),
  ].sort((a, b) => b.relativeU - a.relativeU);
  const weightCt = corrected.reduce((product, { middle }) => product * middle, plan * depthMm * factorCtMm3);
  return { kind: "estimated", weightCt, uWeightCt: weightCt * Math.hypot(...budget.map(({ relativeU }) => relativeU)), formula: name, budget };
}
