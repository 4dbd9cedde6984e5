import fc from "fast-check";
import { expect, test } from "vitest";
import { pseudoInverse } from "#app/gemmology/linear/pseudo-inverse.ts";
import { solve } from "#app/gemmology/linear/solve.ts";
import { symmetricEigen } from "#app/gemmology/linear/symmetric-eigen.ts";

const aSymmetric = fc.integer({ min: 1, max: 7 }).chain((size) =>
  fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: size * size, maxLength: size * size }).map((flat) => Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => flat[i * size + j]! + flat[j * size + i]!))),
);
const times = (a: readonly (readonly number[])[], v: readonly number[]) => a.map((row) => row.reduce((sum, each, at) => sum + each * v[at]!, 0));

test("eigenvectors are stretched by their eigenvalues, stand across each other, and come in order", () => {
  fc.assert(
    fc.property(aSymmetric, (matrix) => {
      const { values, vectors } = symmetricEigen(matrix);
      values.forEach((value, at) => {
        times(matrix, vectors[at]!).forEach((each, i) => expect(each).toBeCloseTo(value * vectors[at]![i]!, 8));
        if (at > 0) expect(value).toBeGreaterThanOrEqual(values[at - 1]!);
      });
    }),
    { numRuns: 200, seed: 1 },
  );
});

test("a solved system gives its right side back, and a singular one is refused", () => {
  expect(times([[4, 1], [2, 3]], solve([[4, 1], [2, 3]], [1, 2]))).toEqual([expect.closeTo(1, 12), expect.closeTo(2, 12)]);
  expect(() => solve([[0, 0], [0, 0]], [1, 1])).toThrow(RangeError);
});

test("a pseudo-inverse leaves alone what the matrix cannot tell", () => {
  expect(pseudoInverse([[4, 0], [0, 0]])).toEqual([[0.25, 0], [0, 0]]);
});
