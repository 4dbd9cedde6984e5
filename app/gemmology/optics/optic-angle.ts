/** 2V about the axis of the largest index, with its standard uncertainty, and the sign that follows. */
export type OpticAngle = Readonly<{ twoVDeg: number; uDeg: number; sign: "+" | "-" | null }>;

const degree = Math.PI / 180;

/**
 * Exact optic angle of a biaxial crystal.
 *
 *   tan² V_z = (1/α² − 1/β²) / (1/β² − 1/γ²);   positive where 2V_z < 90°
 *
 * @param alpha smallest principal index; beta, gamma the others, in order, all different
 * @param covariance of (α, β, γ); absent, the uncertainty is zero
 * @returns sign null where 90° lies within two standard uncertainties
 * @throws RangeError when the indices are not in order
 *
 * Source: crystal optics (Born and Wolf, Principles of Optics, §15.3).
 */
export function opticAngle({ alpha, beta, gamma, covariance }: { alpha: number; beta: number; gamma: number; covariance?: readonly (readonly number[])[] }): OpticAngle {
  if (!(1 < alpha && alpha < beta && beta < gamma)) throw new RangeError(`indices out of order: ${alpha}, ${beta}, ${gamma}`);
  const twoV = (a: number, b: number, c: number) => (2 * Math.atan2(Math.sqrt(Math.max(0, a ** -2 - b ** -2)), Math.sqrt(Math.max(0, b ** -2 - c ** -2)))) / degree;
  const twoVDeg = twoV(alpha, beta, gamma);
  const h = 1e-7;
  const gradient = [twoV(alpha + h, beta, gamma), twoV(alpha, beta + h, gamma), twoV(alpha, beta, gamma + h)].map((value) => (value - twoVDeg) / h);
  const variance = covariance ? gradient.reduce((sum, left, i) => sum + gradient.reduce((inner, right, j) => inner + left * right * covariance[i]![j]!, 0), 0) : 0;
  const uDeg = Math.sqrt(Math.max(0, variance));
  return { twoVDeg, uDeg, sign: Math.abs(twoVDeg - 90) < 2 * uDeg ? null : twoVDeg < 90 ? "+" : "-" };
}
