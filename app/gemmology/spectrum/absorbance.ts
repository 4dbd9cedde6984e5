import type { MeasuredSpectrum } from "./measured-spectrum.ts";

/** What passes through less than this is dark to any bench instrument; its logarithm would be noise. */
const leastShare = 1e-5;

/**
 * Every value as absorbance, so that what the stone takes away stands up: −log₁₀ of a transmittance; of a reflectance
 * the same, which is called apparent absorbance. Arbitrary units stay as they are.
 */
export function absorbanceOf({ yUnit, ys }: Pick<MeasuredSpectrum, "yUnit" | "ys">): number[] {
  if (yUnit === "absorbance" || yUnit === "arbitrary") return [...ys];
  return ys.map((share) => -Math.log10(Math.max(leastShare, share)));
}
