/** A square matrix, row-major. */
export interface DenseMatrix {
  size: number;
  values: Float64Array;
}

/**
 * A square matrix from a rule.
 *
 * @example denseMatrix(2, (i, j) => (i === j ? 1 : 0))
 * @see G. H. Golub and C. F. Van Loan, Matrix Computations, 4th ed., 2013
 */
export function denseMatrix(size: number, entry: (i: number, j: number) => number): DenseMatrix {
  const values = new Float64Array(size * size);
  for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) values[i * size + j] = entry(i, j);
  return { size, values };
}

/**
 * The product of two square matrices.
 *
 * @throws RangeError where the sizes differ
 * @example multiply(identity, a)
 * @see Golub and Van Loan 2013, section 1.1
 */
export function multiply(a: DenseMatrix, b: DenseMatrix): DenseMatrix {
  const { size } = a;
  if (b.size !== size)
    throw new RangeError(`a matrix of size ${size} cannot be multiplied with one of ${b.size}`);
  const out = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    const row = out.subarray(i * size, (i + 1) * size);
    for (let k = 0; k < size; k++) {
      const factor = a.values[i * size + k];
      if (factor === 0) continue;
      const at = k * size;
      for (let j = 0; j < size; j++) row[j] += factor * b.values[at + j];
    }
  }
  return { size, values: out };
}

/**
 * The product of a square matrix and a vector.
 *
 * @throws RangeError where the lengths differ
 * @example multiplyVector(a, Float64Array.of(1, 0))
 * @see Golub and Van Loan 2013, section 1.1
 */
export function multiplyVector(a: DenseMatrix, x: Float64Array): Float64Array {
  if (x.length !== a.size)
    throw new RangeError(`a matrix of size ${a.size} cannot be applied to ${x.length} values`);
  const out = new Float64Array(a.size);
  for (let i = 0; i < a.size; i++) {
    let total = 0;
    for (let j = 0; j < a.size; j++) total += a.values[i * a.size + j] * x[j];
    out[i] = total;
  }
  return out;
}

/**
 * Solve A X = B by elimination with partial pivoting.
 *
 * @param a square matrix, left as it is
 * @param b `columns` right-hand sides, row-major size by columns, left as it is
 * @param columns number of right-hand sides
 * @returns X in the layout of b
 * @throws RangeError where the matrix is singular to working precision
 * @example solveDense(a, Float64Array.of(1, 2), 1)
 * @see Golub and Van Loan 2013, section 3.4
 */
export function solveDense(a: DenseMatrix, b: Float64Array, columns = 1): Float64Array {
  const { size } = a;
  const lu = a.values.slice();
  const x = b.slice();
  for (let k = 0; k < size; k++) {
    const pivot = pivotRow(lu, size, k);
    if (lu[pivot * size + k] === 0)
      throw new RangeError(`the matrix of size ${size} is singular at column ${k}`);
    if (pivot !== k) {
      exchangeRows(lu, size, k, pivot);
      exchangeRows(x, columns, k, pivot);
    }
    for (let i = k + 1; i < size; i++) {
      const factor = lu[i * size + k] / lu[k * size + k];
      if (factor === 0) continue;
      for (let j = k + 1; j < size; j++) lu[i * size + j] -= factor * lu[k * size + j];
      for (let c = 0; c < columns; c++) x[i * columns + c] -= factor * x[k * columns + c];
    }
  }
  for (let i = size - 1; i >= 0; i--) {
    for (let j = i + 1; j < size; j++) {
      const factor = lu[i * size + j];
      if (factor !== 0) for (let c = 0; c < columns; c++) x[i * columns + c] -= factor * x[j * columns + c];
    }
    for (let c = 0; c < columns; c++) x[i * columns + c] /= lu[i * size + i];
  }
  return x;
}

function pivotRow(lu: Float64Array, size: number, k: number): number {
  let pivot = k;
  for (let i = k + 1; i < size; i++) {
    if (Math.abs(lu[i * size + k]) > Math.abs(lu[pivot * size + k])) pivot = i;
  }
  return pivot;
}

function exchangeRows(values: Float64Array, columns: number, i: number, k: number): void {
  const row = values.slice(i * columns, (i + 1) * columns);
  values.copyWithin(i * columns, k * columns, (k + 1) * columns);
  values.set(row, k * columns);
}
