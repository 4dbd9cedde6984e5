import { requireRange } from "../require-range.ts";

/** Student's factor for 68.27 % at n − 1 degrees of freedom, n from 2 on: JCGM 100:2008, table G.2. */
const student = [1.84, 1.32, 1.2, 1.14, 1.11, 1.09, 1.08, 1.07, 1.06];

/**
 * Mean of repeated readings and its standard uncertainty: that of the scatter, widened for few repeats, with the
 * uncertainty that all repeats share.
 *
 * @param values at least one
 * @param uShared standard uncertainty that repeating does not reduce (the instrument's), ≥ 0, in the values' unit
 * @returns mean, standard uncertainty and the values' standard deviation (null of a single one), unrounded
 * @throws RangeError when there is no value, or one is not finite
 *
 * Source: JCGM 100:2008, 4.2.3 and G.3.
 * @example meanOfRepeats([5.216, 5.216, 5.215]).mean // ≈ 5.21567
 */
export function meanOfRepeats(values: readonly number[], uShared = 0): Readonly<{ mean: number; u: number; standardDeviation: number | null }> {
  requireRange("number of values", values.length, values.length >= 1);
  for (const value of values) requireRange("value", value, true);
  requireRange("uShared", uShared, uShared >= 0);
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  if (values.length === 1) return { mean, u: uShared, standardDeviation: null };
  const standardDeviation = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
  const factor = student[values.length - 2] ?? 1;
  return { mean, u: Math.hypot((factor * standardDeviation) / Math.sqrt(values.length), uShared), standardDeviation };
}
