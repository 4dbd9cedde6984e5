import fc from "fast-check";
import { EigenvalueDecomposition, Matrix, pseudoInverse as libraryPseudoInverse, solve as librarySolve } from "ml-matrix";
import { expect, test } from "vitest";
import { pseudoInverse } from "#app/gemmology/linear/pseudo-inverse.ts";
import { solve } from "#app/gemmology/linear/solve.ts";
import { symmetricEigen } from "#app/gemmology/linear/symmetric-eigen.ts";

/** Thousandths: on entries at the end of what a double holds the library gives up. */
const anEntry = fc.integer({ min: -5_000, max: 5_000 }).map((value) => value / 1_000);
const aSymmetricMatrix = fc.integer({ min: 2, max: 7 }).chain((size) => fc.array(fc.array(anEntry, { minLength: size, maxLength: size }), { minLength: size, maxLength: size }).map((rows) => rows.map((row, i) => row.map((value, j) => value + rows[j]![i]!))));

test("eigenvalues agree with a general-purpose library", () => {
  fc.assert(
    fc.property(aSymmetricMatrix, (matrix) => {
      const library = new EigenvalueDecomposition(new Matrix(matrix), { assumeSymmetric: true }).realEigenvalues.sort((a, b) => a - b);
      symmetricEigen(matrix).values.forEach((value, at) => expect(value).toBeCloseTo(library[at]!, 8));
    }),
    { numRuns: 300, seed: 11 },
  );
});

test("solutions and pseudo-inverses agree with a general-purpose library", () => {
  fc.assert(
    fc.property(aSymmetricMatrix, fc.integer({ min: 0, max: 6 }), (matrix, from) => {
      // MᵀM + 1 is positive and well conditioned.
      const square = Matrix.mul(new Matrix(matrix), 1).mmul(new Matrix(matrix)).add(Matrix.eye(matrix.length));
      const rows = square.to2DArray();
      const right = rows.map((_, at) => ((at * 7 + from) % 5) - 2);
      const library = librarySolve(square, Matrix.columnVector(right)).to1DArray();
      solve(rows, right).forEach((value, at) => expect(value).toBeCloseTo(library[at]!, 7));
      const inverse = libraryPseudoInverse(square).to2DArray();
      pseudoInverse(rows).forEach((row, i) => row.forEach((value, j) => expect(value).toBeCloseTo(inverse[i]![j]!, 7)));
    }),
    { numRuns: 300, seed: 11 },
  );
});
