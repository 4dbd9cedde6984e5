import { requireRange } from "../require-range.ts";

/** n = a + b/λ², λ in micrometres; good for the visible alone. */
export type Cauchy = Readonly<{ a: number; b: number }>;
type Line = { nm: number; n: number };

/**
 * Cauchy's formula through two lines.
 *
 * @throws RangeError when the wavelengths are the same
 *
 * Source: Cauchy 1836, first two terms.
 */
export function cauchyThrough(first: Line, second: Line): Cauchy {
  requireRange("nm", second.nm, Math.abs(second.nm - first.nm) > 1 && first.nm > 100 && second.nm > 100);
  const inverse = ({ nm }: Line) => (nm / 1000) ** -2;
  const b = (first.n - second.n) / (inverse(first) - inverse(second));
  return { a: first.n - b * inverse(first), b };
}

export const cauchyIndex = ({ a, b }: Cauchy, nm: number): number => a + b * (nm / 1000) ** -2;
