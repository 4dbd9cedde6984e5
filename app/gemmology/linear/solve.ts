import type { Matrix } from "./symmetric-eigen.ts";

/**
 * Solves A·x = b by Gauss elimination with row pivots.
 *
 * @throws RangeError when A is singular
 */
export function solve(matrix: Matrix, right: readonly number[]): number[] {
  const size = right.length;
  const a = matrix.map((row, i) => [...row, right[i]!]);
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++) if (Math.abs(a[row]![column]!) > Math.abs(a[pivot]![column]!)) pivot = row;
    if (!(Math.abs(a[pivot]![column]!) > 1e-300)) throw new RangeError("the matrix is singular");
    [a[column], a[pivot]] = [a[pivot]!, a[column]!];
    for (let row = column + 1; row < size; row++) {
      const factor = a[row]![column]! / a[column]![column]!;
      for (let k = column; k <= size; k++) a[row]![k]! -= factor * a[column]![k]!;
    }
  }
  const x = new Array<number>(size).fill(0);
  for (let row = size - 1; row >= 0; row--) {
    let sum = a[row]![size]!;
    for (let k = row + 1; k < size; k++) sum -= a[row]![k]! * x[k]!;
    x[row] = sum / a[row]![row]!;
  }
  return x;
}
