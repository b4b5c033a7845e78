/** Error norms from the sums over a grid: of one field, and combined over several. */

import { ErrorSums } from "./error-sums";

/** Domain-integral norms of the error, and the same over the exact solution's (null where that norm vanishes). */
export interface ErrorNorms {
  l1: number;
  l2: number;
  max: number;
  relL1: number | null;
  relL2: number | null;
  relMax: number | null;
}

/** Values of a field at the nodes of a grid: row-major, imaginary part null for real data. */
export interface GridValues {
  values: Float64Array;
  imaginary: Float64Array | null;
}

/** Below this an exact norm counts as zero. */
const smallestNorm = 1e-300;

const ratio = (error: number, exact: number) => (exact < smallestNorm ? null : error / exact);

/**
 * The sums of error and exact solution over a tensor-product grid.
 *
 * @param u values of the field, row-major, one value for each node
 * @param exact exact values, same layout
 * @param weights quadrature weights of each axis, slowest axis first (one or two axes)
 * @returns sums that `normsOf` turns into norms
 * @throws RangeError where the values do not fill the grid
 * @example sumErrors({ values: u, imaginary: null }, { values: exact, imaginary: null }, [weights]).errorMax
 * @see LeVeque 2007, appendix A
 */
export function sumErrors(u: GridValues, exact: GridValues, weights: readonly Float64Array[]): ErrorSums {
  const inner = weights[weights.length - 1];
  const outer = weights.length === 2 ? weights[0] : Float64Array.of(1);
  const count = outer.length * inner.length;
  if (u.values.length !== count || exact.values.length !== count) {
    throw new RangeError(
      `A grid of ${count} nodes needs ${count} values, not ${u.values.length} and ${exact.values.length}`,
    );
  }
  const sums = new ErrorSums();
  if (u.imaginary === null && exact.imaginary === null) {
    for (let i = 0; i < outer.length; i++) {
      sums.add(u.values, exact.values, inner, i * inner.length, outer[i]);
    }
    return sums;
  }
  const zero = u.imaginary && exact.imaginary ? null : new Float64Array(count);
  const first = { values: u.values, imaginary: u.imaginary ?? zero ?? new Float64Array(count) };
  const second = { values: exact.values, imaginary: exact.imaginary ?? zero ?? new Float64Array(count) };
  for (let i = 0; i < outer.length; i++) {
    sums.addComplex(first, second, inner, i * inner.length, outer[i]);
  }
  return sums;
}

/**
 * The norms that sums over one or more fields make: L1 sum, L2 root of the sum of squares, max the largest; relative
 * norms are ratios of the combined norms.
 *
 * @param fields sums of each field
 * @returns norms in the unit of the field times the unit of the domain's measure (L1) or its root (L2)
 * @example normsOf([sumErrors(u, exact, [weights])]).relL2
 * @see LeVeque 2007, appendix A; Oberkampf and Roy 2010, section 5.4 (relative discretisation error norms)
 */
export function normsOf(fields: readonly ErrorSums[]): ErrorNorms {
  let l1 = 0;
  let square = 0;
  let max = 0;
  let exactL1 = 0;
  let exactSquare = 0;
  let exactMax = 0;
  for (const sums of fields) {
    l1 += sums.errorL1;
    square += sums.errorSquare;
    max = Math.max(max, sums.errorMax);
    exactL1 += sums.exactL1;
    exactSquare += sums.exactSquare;
    exactMax = Math.max(exactMax, sums.exactMax);
  }
  const l2 = Math.sqrt(square);
  return {
    l1,
    l2,
    max,
    relL1: ratio(l1, exactL1),
    relL2: ratio(l2, Math.sqrt(exactSquare)),
    relMax: ratio(max, exactMax),
  };
}
