/** 2V about the axis of the largest index, with its standard uncertainty, and the sign that follows. */
export type OpticAngle = Readonly<{
  twoVDeg: number;
  uDeg: number;
  /** Where 2V lies with about 95 % confidence: not symmetric, and ending at 0° and 180°. */
  rangeDeg: readonly [low: number, high: number];
  /** The smaller of 2V and 180° − 2V, as tables print it. */
  acuteDeg: number;
  sign: "+" | "-" | null;
}>;

/**
 * Exact optic angle of a biaxial crystal.
 *
 *   sin² V_z = (1/α² − 1/β²) / (1/α² − 1/γ²);   positive where 2V_z < 90°
 *
 * The uncertainty is propagated to sin² V, which is nearly linear in the indices, and carried from there to the angle: so
 * it stays finite where two indices nearly meet.
 *
 * @param alpha smallest principal index, above 1; beta, gamma the others, in order, α < γ
 * @param covariance of (α, β, γ); absent, the uncertainty is zero
 * @returns angles in degrees, unrounded; sign null where 90° lies within two standard uncertainties
 * @throws RangeError when the indices are not in order, or the covariance is not that of three indices
 *
 * Source: crystal optics (Born and Wolf, Principles of Optics, §15.3); propagation by JCGM 100:2008, 5.2.2.
 * @example opticAngle({ alpha: 1.61, beta: 1.613, gamma: 1.62 }).twoVDeg // ≈ 66.7, topaz
 */
export function opticAngle({ alpha, beta, gamma, covariance }: { alpha: number; beta: number; gamma: number; covariance?: readonly (readonly number[])[] }): OpticAngle {
  if (!(1 < alpha && alpha <= beta && beta <= gamma && alpha < gamma && gamma <= 4)) throw new RangeError(`indices out of order: ${alpha}, ${beta}, ${gamma}`);
  const [a, b, c] = [alpha ** -2, beta ** -2, gamma ** -2];
  const share = (a - b) / (a - c);
  // Of sin² V to α, β, γ: ∂a/∂α = −2/α³ and so on.
  const gradient = [((b - c) / (a - c) ** 2) * (-2 / alpha ** 3), (-1 / (a - c)) * (-2 / beta ** 3), (share / (a - c)) * (-2 / gamma ** 3)];
  const variance = covariance ? gradient.reduce((sum, left, i) => sum + gradient.reduce((inner, right, j) => inner + left * right * entry(covariance, i, j), 0), 0) : 0;
  const u = Math.sqrt(Math.max(0, variance));
  const twoVDeg = degrees(share);
  return {
    twoVDeg,
    uDeg: (degrees(share + u) - degrees(share - u)) / 2,
    rangeDeg: [degrees(share - 1.96 * u), degrees(share + 1.96 * u)],
    acuteDeg: Math.min(twoVDeg, 180 - twoVDeg),
    sign: Math.abs(share - 0.5) < 2 * u ? null : share < 0.5 ? "+" : "-",
  };
}

const degrees = (share: number) => (2 * Math.asin(Math.sqrt(Math.min(1, Math.max(0, share)))) * 180) / Math.PI;

function entry(covariance: readonly (readonly number[])[], i: number, j: number): number {
  const value = covariance[i]?.[j];
  if (value === undefined || !Number.isFinite(value)) throw new RangeError(`covariance out of range: ${value} at ${i}, ${j}`);
  return value;
}
