import { describe, expect, it } from "vitest";

import { chebyshevMatrix, chebyshevSecondMatrix } from "@/benchmarks/solvers/chebyshev-matrix";
import {
  type DenseMatrix,
  denseMatrix,
  multiply,
  multiplyVector,
  solveDense,
} from "@/benchmarks/solvers/dense-matrix";
import { matrixExponential } from "@/benchmarks/solvers/matrix-exponential";
import { solveTridiagonal } from "@/benchmarks/solvers/tridiagonal";

const matrixOf = (rows: number[][]) => denseMatrix(rows.length, (i, j) => rows[i][j]);

function expectMatrix(found: DenseMatrix, rows: number[][], tolerance: number) {
  rows.flat().forEach((value, k) => expect(Math.abs(found.values[k] - value)).toBeLessThanOrEqual(tolerance));
}

describe("the Chebyshev differentiation matrix", () => {
  const s2 = Math.SQRT2;
  // Trefethen, Spectral Methods in MATLAB, SIAM, 2000, chapter 6, theorem 7 (from memory; entries verified from Lagrange
  // polynomials). Nodes run from +1 down there and from -1 up here, which turns the matrix round.
  it.each([
    [
      [1 / 2, -1 / 2],
      [1 / 2, -1 / 2],
    ],
    [
      [3 / 2, -2, 1 / 2],
      [1 / 2, 0, -1 / 2],
      [-1 / 2, 2, -3 / 2],
    ],
    [
      [19 / 6, -4, 4 / 3, -1 / 2],
      [1, -1 / 3, -1, 1 / 3],
      [-1 / 3, 1, 1 / 3, -1],
      [1 / 2, -4 / 3, 4, -19 / 6],
    ],
    [
      [11 / 2, -4 - 2 * s2, 2, -4 + 2 * s2, 1 / 2],
      [s2 / 2 + 1, -s2 / 2, -s2, s2 / 2, -1 + s2 / 2],
      [-1 / 2, s2, 0, -s2, 1 / 2],
      [1 - s2 / 2, -s2 / 2, s2, s2 / 2, -1 - s2 / 2],
      [-1 / 2, 4 - 2 * s2, -2, 2 * s2 + 4, -11 / 2],
    ],
  ])("is the published one", (...rows) => {
    const turned = [...rows].reverse().map((row) => [...row].reverse());
    expectMatrix(chebyshevMatrix(rows.length, -1, 1), turned, 8e-15);
  });

  it.each([
    [5, 17 / 2],
    [8, 43 / 2],
    [16, 171 / 2],
  ])("has the published corner for %i intervals", (intervals, corner) => {
    const { values } = chebyshevMatrix(intervals + 1, -1, 1);
    expect(Math.abs(values[0] + corner)).toBeLessThan(64 * Number.EPSILON * corner);
    expect(Math.abs(values[values.length - 1] - corner)).toBeLessThan(64 * Number.EPSILON * corner);
  });

  it("vanishes at the power of its size and differentiates polynomials exactly", () => {
    const d = chebyshevMatrix(5, -1, 1);
    const fifth = multiply(multiply(multiply(d, d), multiply(d, d)), d);
    fifth.values.forEach((value) => expect(Math.abs(value)).toBeLessThan(1e-10));
    const x = Float64Array.from({ length: 5 }, (_, j) => 1.5 - 0.5 * Math.cos((Math.PI * j) / 4));
    const slope = multiplyVector(
      chebyshevMatrix(5, 1, 2),
      x.map((s) => s ** 4),
    );
    const bend = multiplyVector(
      chebyshevSecondMatrix(5, 1, 2),
      x.map((s) => s ** 4),
    );
    x.forEach((s, j) => {
      expect(Math.abs(slope[j] - 4 * s ** 3)).toBeLessThan(1e-12);
      expect(Math.abs(bend[j] - 12 * s * s)).toBeLessThan(1e-10);
    });
  });
});

describe("dense systems", () => {
  it("are solved with pivoting for several right-hand sides", () => {
    const a = matrixOf([
      [0, 2, 1],
      [1, 1, 1],
      [2, 0, 3],
    ]);
    const solution = solveDense(a, Float64Array.of(5, 1, 6, 0, 11, 1), 2);
    const check = multiply(
      a,
      matrixOf([
        [solution[0], solution[1], 0],
        [solution[2], solution[3], 0],
        [solution[4], solution[5], 0],
      ]),
    );
    expectMatrix(
      check,
      [
        [5, 1, 0],
        [6, 0, 0],
        [11, 1, 0],
      ],
      1e-14,
    );
  });

  it("that are singular are refused", () => {
    expect(() =>
      solveDense(
        matrixOf([
          [1, 2],
          [2, 4],
        ]),
        Float64Array.of(1, 1),
      ),
    ).toThrow(/singular/);
  });

  it("with three diagonals agree with dense elimination", () => {
    const n = 9;
    const [lower, diagonal, upper] = [-1.1, 2.7, -0.8].map((value) => new Float64Array(n).fill(value));
    const right = Float64Array.from({ length: n }, (_, j) => Math.cos(j));
    const dense = denseMatrix(n, (i, j) => (i === j ? 2.7 : i === j + 1 ? -1.1 : j === i + 1 ? -0.8 : 0));
    const expected = solveDense(dense, right);
    solveTridiagonal(lower, diagonal, upper, right).forEach((value, j) =>
      expect(Math.abs(value - expected[j])).toBeLessThan(1e-15),
    );
  });
});

describe("the matrix exponential", () => {
  it("of a rotation is a rotation, however large the angle", () => {
    for (const angle of [0.1, 3, 40]) {
      const rotation = matrixExponential(
        matrixOf([
          [0, -angle],
          [angle, 0],
        ]),
      );
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      expectMatrix(
        rotation,
        [
          [c, -s],
          [s, c],
        ],
        1e-13,
      );
    }
  });

  it("of a nilpotent matrix is its finite series", () => {
    expectMatrix(
      matrixExponential(
        matrixOf([
          [0, 1, 2],
          [0, 0, 3],
          [0, 0, 0],
        ]),
      ),
      [
        [1, 1, 3.5],
        [0, 1, 3],
        [0, 0, 1],
      ],
      1e-15,
    );
  });

  it("of a stiff matrix keeps the slow part", () => {
    // Eigenvalues -1 and -1e6 with eigenvectors (1, 1) and (1, -1).
    const [sum, difference] = [-(1 + 1e6) / 2, (-1 + 1e6) / 2];
    const slow = Math.exp(-1) / 2;
    expectMatrix(
      matrixExponential(
        matrixOf([
          [sum, difference],
          [difference, sum],
        ]),
      ),
      [
        [slow, slow],
        [slow, slow],
      ],
      1e-9,
    );
  });

  it("refuses entries that are not finite", () => {
    expect(() => matrixExponential(matrixOf([[NaN]]))).toThrow(RangeError);
  });
});
