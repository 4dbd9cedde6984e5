/**
 * Φ(z), the standard normal distribution function.
 *
 * Fractional error of the complementary error function below 1.2e-7 everywhere, tails included (Chebyshev fit given in
 * Press et al., Numerical Recipes, 2nd ed., §6.2; coefficients from memory, checked against a series in the tests).
 */
export function normalCdf(z: number): number {
  const x = Math.abs(z) * Math.SQRT1_2;
  const t = 1 / (1 + 0.5 * x);
  const tail =
    0.5 * t * Math.exp(-x * x - 1.26551223 + t * (1.00002368 + t * (0.37409196 + t * (0.09678418 + t * (-0.18628806 + t * (0.27886807 + t * (-1.13520398 + t * (1.48851587 + t * (-0.82215223 + t * 0.17087277)))))))));
  return z < 0 ? tail : 1 - tail;
}
