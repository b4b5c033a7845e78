/**
 * Solve a tridiagonal system without pivoting; for diagonally dominant matrices.
 *
 * @param lower n entries below the diagonal, the first unused
 * @param diagonal n entries
 * @param upper n entries above the diagonal, the last unused
 * @param right n values
 * @returns n values, a new array
 * @throws RangeError where a pivot vanishes
 * @example solveTridiagonal(lower, diagonal, upper, right)
 * @see G. H. Golub and C. F. Van Loan, Matrix Computations, 4th ed., 2013, section 4.3.6
 */
export function solveTridiagonal(
  lower: Float64Array,
  diagonal: Float64Array,
  upper: Float64Array,
  right: Float64Array,
): Float64Array {
  const n = diagonal.length;
  const ratio = new Float64Array(n);
  const out = new Float64Array(n);
  let pivot = diagonal[0];
  out[0] = right[0] / pivot;
  for (let j = 1; j < n; j++) {
    ratio[j] = upper[j - 1] / pivot;
    pivot = diagonal[j] - lower[j] * ratio[j];
    if (pivot === 0) throw new RangeError(`the tridiagonal matrix has a zero pivot in row ${j}`);
    out[j] = (right[j] - lower[j] * out[j - 1]) / pivot;
  }
  for (let j = n - 2; j >= 0; j--) out[j] -= ratio[j + 1] * out[j + 1];
  return out;
}
