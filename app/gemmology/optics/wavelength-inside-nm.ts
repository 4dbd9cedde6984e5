import { requireRange } from "../require-range.ts";

/**
 * Wavelength of light inside a stone; its frequency stays.
 *
 * @param n index of the ray at that wavelength, in [1, 4]
 * @param outsideNm wavelength outside, nm, in (0, 10 000]; sodium light is 589.3
 * @returns wavelength inside, nm, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: λ = λ₀/n, standard optics.
 * @example wavelengthInsideNm({ n: 1.762 }) // ≈ 334.4
 */
export function wavelengthInsideNm({ n, outsideNm = 589.3 }: { n: number; outsideNm?: number }): number {
  requireRange("n", n, n >= 1 && n <= 4);
  requireRange("outsideNm", outsideNm, outsideNm > 0 && outsideNm <= 10_000);
  return outsideNm / n;
}
