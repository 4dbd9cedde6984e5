export type Matrix = readonly (readonly number[])[];

/**
 * Eigenvalues, ascending, and unit eigenvectors (as rows) of a real symmetric matrix, by cyclic Jacobi rotations.
 * Meant for small matrices; exact to rounding for those.
 *
 * Source: Golub and Van Loan, Matrix Computations, §8.5.
 */
export function symmetricEigen(matrix: Matrix): { values: number[]; vectors: number[][] } {
  const size = matrix.length;
  const a = matrix.map((row) => [...row]);
  const v: number[][] = Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => (i === j ? 1 : 0)));
  for (let sweep = 0; sweep < 60; sweep++) {
    let off = 0;
    let scale = 0;
    for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) if (i === j) scale += a[i]![i]! ** 2; else off += a[i]![j]! ** 2;
    if (off <= 1e-30 * Math.max(scale, 1e-300)) break;
    for (let p = 0; p < size; p++)
      for (let q = p + 1; q < size; q++) {
        const apq = a[p]![q]!;
        if (apq === 0) continue;
        const theta = (a[q]![q]! - a[p]![p]!) / (2 * apq);
        const t = Math.sign(theta || 1) / (Math.abs(theta) + Math.hypot(theta, 1));
        const c = 1 / Math.hypot(t, 1);
        const s = t * c;
        for (let k = 0; k < size; k++) {
          const [akp, akq] = [a[k]![p]!, a[k]![q]!];
          a[k]![p] = c * akp - s * akq;
          a[k]![q] = s * akp + c * akq;
        }
        for (let k = 0; k < size; k++) {
          const [apk, aqk] = [a[p]![k]!, a[q]![k]!];
          a[p]![k] = c * apk - s * aqk;
          a[q]![k] = s * apk + c * aqk;
          const [vkp, vkq] = [v[k]![p]!, v[k]![q]!];
          v[k]![p] = c * vkp - s * vkq;
          v[k]![q] = s * vkp + c * vkq;
        }
      }
  }
  const order = Array.from({ length: size }, (_, i) => i).sort((i, j) => a[i]![i]! - a[j]![j]!);
  return { values: order.map((i) => a[i]![i]!), vectors: order.map((i) => v.map((row) => row[i]!)) };
}
