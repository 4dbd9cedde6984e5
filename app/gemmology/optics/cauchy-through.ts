import { requireRange } from "../require-range.ts";
import type { DispersionFormula } from "./dispersion-formula.ts";

/**
 * Cauchy's formula n = a + b/λ² through indices at two wavelengths. In visible light it stays within a few units of the
 * fourth decimal of what strongly dispersive gems show, and nearer for others.
 *
 * @param one, other wavelength in air, nm, in [380, 780], at least 20 nm apart, and the index there
 * @throws RangeError when a value leaves its range
 *
 * Source: A. L. Cauchy, two terms, standard optics.
 * @example cauchyThrough({ nm: 430.8, n: 2.4517 }, { nm: 686.7, n: 2.4073 }) // a ≈ 2.3784, b ≈ 0.01360
 */
export function cauchyThrough(one: Readonly<{ nm: number; n: number }>, other: Readonly<{ nm: number; n: number }>): Extract<DispersionFormula, { kind: "cauchy" }> {
  for (const { nm, n } of [one, other]) {
    requireRange("nm", nm, nm >= 380 && nm <= 780);
    requireRange("n", n, n >= 1 && n <= 4);
  }
  requireRange("nm between the two", Math.abs(one.nm - other.nm), Math.abs(one.nm - other.nm) >= 20);
  const [x, y] = [(one.nm / 1000) ** -2, (other.nm / 1000) ** -2];
  const b = (one.n - other.n) / (x - y);
  return { kind: "cauchy", a: one.n - b * x, b, fromNm: 380, toNm: 780 };
}
