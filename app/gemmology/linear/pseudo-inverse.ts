import { symmetricEigen, type Matrix } from "./symmetric-eigen.ts";

/** Moore–Penrose inverse of a real symmetric matrix that is not negative; directions below `relativeTolerance` of the largest count as undetermined. */
export function pseudoInverse(matrix: Matrix, relativeTolerance = 1e-12): number[][] {
  const { values, vectors } = symmetricEigen(matrix);
  const least = relativeTolerance * Math.max(...values.map(Math.abs));
  const size = matrix.length;
  const inverse = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  values.forEach((value, at) => {
    if (value <= least) return;
    const vector = vectors[at]!;
    for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) inverse[i]![j]! += (vector[i]! * vector[j]!) / value;
  });
  return inverse;
}
