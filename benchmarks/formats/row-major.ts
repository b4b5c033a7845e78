/** Arrays stored column by column (Fortran, MATLAB) into row-major order. */

// Two blocks of 32 by 32 doubles fit the first-level cache.
const block = 32;

/**
 * Turns values stored in Fortran order (first axis fastest) into row-major order (last axis fastest).
 *
 * @param values as stored, as many as the product of the shape
 * @param shape lengths of the axes, first axis first
 * @returns the same array where the orders agree (up to one axis), else a new one
 * @throws RangeError where the number of values differs from the shape's product
 * @example undoFortranOrder(Float64Array.of(1, 3, 2, 4), [2, 2]) // 1, 2, 3, 4
 * @see https://numpy.org/doc/stable/glossary.html#term-Fortran-order
 */
export function undoFortranOrder(values: Float64Array, shape: readonly number[]): Float64Array {
  const count = shape.reduce((product, length) => product * length, 1);
  if (count !== values.length)
    throw new RangeError(`${values.length} values do not fill a shape of ${count}`);
  if (shape.length < 2 || count === 0) return values;
  const [first, ...rest] = shape;
  const restCount = count / first;
  const rows = new Float64Array(count);
  transpose(values, restCount, first, rows);
  if (rest.length < 2) return rows;
  for (let i = 0; i < first; i++) {
    const row = rows.subarray(i * restCount, (i + 1) * restCount);
    row.set(undoFortranOrder(row, rest));
  }
  return rows;
}

/** out[j][i] = values[i][j], by blocks so that neither side is read across the whole memory. */
function transpose(values: Float64Array, rowCount: number, columnCount: number, out: Float64Array): void {
  for (let i0 = 0; i0 < rowCount; i0 += block) {
    const i1 = Math.min(i0 + block, rowCount);
    for (let j0 = 0; j0 < columnCount; j0 += block) {
      const j1 = Math.min(j0 + block, columnCount);
      for (let i = i0; i < i1; i++) {
        for (let j = j0; j < j1; j++) out[j * rowCount + i] = values[i * columnCount + j];
      }
    }
  }
}
