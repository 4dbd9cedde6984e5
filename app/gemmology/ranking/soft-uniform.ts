import { normalCdf } from "../statistics/normal-cdf.ts";
import { normalPdf } from "../statistics/normal-pdf.ts";

/**
 * A quantity that varies evenly between `low` and `high` in nature, read with a Gaussian error of standard deviation
 * `sigma`: uniform ⊗ Gaussian. All arguments in the same unit; sigma > 0.
 */
export type SoftUniform = Readonly<{ low: number; high: number; sigma: number }>;

/** Widths below this count as a single value: the quotient would lose its digits. */
const pointWidth = 1e-9;

/** Probability density of reading x, per unit of x. */
export function softUniformDensity({ low, high, sigma }: SoftUniform, x: number): number {
  if (high - low < pointWidth) return normalPdf((x - low) / sigma) / sigma;
  return between((x - high) / sigma, (x - low) / sigma) / (high - low);
}

/** Probability that the reading is at most x. */
export function softUniformCdf({ low, high, sigma }: SoftUniform, x: number): number {
  if (high - low < pointWidth) return normalCdf((x - low) / sigma);
  const zLow = (x - low) / sigma;
  const zHigh = (x - high) / sigma;
  const value = ((x - low) * normalCdf(zLow) + sigma * normalPdf(zLow) - (x - high) * normalCdf(zHigh) - sigma * normalPdf(zHigh)) / (high - low);
  return Math.min(1, Math.max(0, value));
}

/** Probability that the reading is above x; exact in the upper tail, where 1 − F would vanish. */
export function softUniformSurvival({ low, high, sigma }: SoftUniform, x: number): number {
  return softUniformCdf({ low: -high, high: -low, sigma }, -x);
}

/** Two-sided predictive probability of a reading at least as far out as x: 2·min(F, 1 − F). */
export function softUniformTwoSided(range: SoftUniform, x: number): number {
  return Math.min(1, 2 * Math.min(softUniformCdf(range, x), softUniformSurvival(range, x)));
}

/** Φ(b) − Φ(a), a ≤ b, taken in whichever tail keeps its digits. */
function between(a: number, b: number): number {
  return a > 0 ? normalCdf(-a) - normalCdf(-b) : normalCdf(b) - normalCdf(a);
}
