import { type DenseMatrix, denseMatrix, multiply } from "./dense-matrix";

/**
 * The matrix that differentiates the polynomial through values on the Chebyshev-Lobatto nodes.
 *
 * Differences of nodes are products of sines, and each diagonal entry is minus the sum of the others in its row, so
 * that constants are differentiated to zero.
 *
 * @param nodes number of nodes, 2 or more, ascending on [a, b]
 * @param a left end
 * @param b right end
 * @returns matrix of that size
 * @throws RangeError where there are fewer than two nodes
 * @example chebyshevMatrix(3, -1, 1).values[0] // -1.5
 * @see L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000, chapter 6; R. Baltensperger and M. R. Trummer, SIAM J.
 *   Sci. Comput. 24 (2003) 1465-1487 (the diagonal)
 */
export function chebyshevMatrix(nodes: number, a: number, b: number): DenseMatrix {
  if (nodes < 2) throw new RangeError(`a differentiation matrix needs two nodes or more, not ${nodes}`);
  const intervals = nodes - 1;
  const end = (j: number) => (j === 0 || j === intervals ? 2 : 1);
  // x_i - x_j of the ascending nodes -cos(pi j/N) on [-1, 1].
  const gap = (i: number, j: number) =>
    2 * Math.sin((Math.PI * (i + j)) / (2 * intervals)) * Math.sin((Math.PI * (i - j)) / (2 * intervals));
  const matrix = denseMatrix(nodes, (i, j) =>
    i === j ? 0 : ((end(i) / end(j)) * (-1) ** (i + j)) / gap(i, j),
  );
  return withZeroRowSums({ size: nodes, values: matrix.values.map((value) => (value * 2) / (b - a)) });
}

/**
 * The matrix of the second derivative on Chebyshev-Lobatto nodes: the first applied twice.
 *
 * @see chebyshevMatrix
 * @example chebyshevSecondMatrix(3, -1, 1).values[1] // -2
 */
export function chebyshevSecondMatrix(nodes: number, a: number, b: number): DenseMatrix {
  const first = chebyshevMatrix(nodes, a, b);
  return withZeroRowSums(multiply(first, first));
}

function withZeroRowSums({ size, values }: DenseMatrix): DenseMatrix {
  for (let i = 0; i < size; i++) {
    let others = 0;
    for (let j = 0; j < size; j++) if (j !== i) others += values[i * size + j];
    values[i * size + i] = -others;
  }
  return { size, values };
}
