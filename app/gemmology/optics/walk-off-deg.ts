import { requireRange } from "../require-range.ts";

/**
 * Angle between the two rays into which a doubly refractive stone splits light that enters straight.
 *
 * @param omega index of the ordinary ray, in [1, 4]; of a biaxial stone α, for the largest split of all
 * @param epsilon index of the extraordinary ray, in [1, 4]; of a biaxial stone γ
 * @param fromAxisDeg angle of the light to the optic axis, degrees, in [0, 90]; where it is absent, that of the largest split
 * @returns degrees, unrounded
 * @throws RangeError when an argument leaves its range
 *
 * Source: crystal optics: tan ρ = |ε² − ω²| sin θ cos θ/(ε² cos² θ + ω² sin² θ), largest |ε² − ω²|/(2εω).
 * @example walkOffDeg({ omega: 1.6584, epsilon: 1.4864 }) // ≈ 6.26, calcite
 */
export function walkOffDeg({ omega, epsilon, fromAxisDeg }: { omega: number; epsilon: number; fromAxisDeg?: number }): number {
  requireRange("omega", omega, omega >= 1 && omega <= 4);
  requireRange("epsilon", epsilon, epsilon >= 1 && epsilon <= 4);
  const difference = Math.abs(epsilon ** 2 - omega ** 2);
  if (fromAxisDeg === undefined) return (Math.atan(difference / (2 * epsilon * omega)) * 180) / Math.PI;
  requireRange("fromAxisDeg", fromAxisDeg, fromAxisDeg >= 0 && fromAxisDeg <= 90);
  const theta = (fromAxisDeg * Math.PI) / 180;
  const [sine, cosine] = [Math.sin(theta), Math.cos(theta)];
  return (Math.atan((difference * sine * cosine) / (epsilon ** 2 * cosine ** 2 + omega ** 2 * sine ** 2)) * 180) / Math.PI;
}
