/** The grid convergence index of Celik et al. (2008). */

/** What three grids say about a quantity, without knowing its exact value. */
export interface GridConvergenceIndex {
  /** Apparent order p. */
  order: number;
  /** Extrapolated value, (r21^p phi_1 - phi_2) / (r21^p - 1). */
  extrapolated: number;
  /** |(phi_1 - phi_2) / phi_1|. */
  approximateError: number;
  /** |(extrapolated - phi_1) / extrapolated|. */
  extrapolatedError: number;
  /** 1.25 approximateError / (r21^p - 1): relative uncertainty of phi_1. */
  index: number;
  /** The differences of the three values have opposite signs. */
  isOscillatory: boolean;
}

/**
 * Solves p ln r21 = |ln|eps32/eps21| + ln((r21^p - s)/(r32^p - s))| by bisection on sign changes.
 *
 * The fixed-point iteration of the paper fails where the map is not a contraction; its solutions are the same.
 */
function apparentOrder(ratio: number, sign: number, r21: number, r32: number): number | null {
  const gap = (p: number) =>
    Math.abs(Math.log(Math.abs(ratio)) + Math.log((r21 ** p - sign) / (r32 ** p - sign))) / Math.log(r21) - p;
  let low = 1e-6;
  let gapLow = gap(low);
  for (let high = 0.05; high <= 60; high += 0.05) {
    const gapHigh = gap(high);
    if (Number.isFinite(gapLow) && gapLow > 0 && gapHigh <= 0) {
      let a = low;
      let b = high;
      for (let step = 0; step < 80; step++) {
        const middle = (a + b) / 2;
        if (gap(middle) > 0) a = middle;
        else b = middle;
      }
      return (a + b) / 2;
    }
    low = high;
    gapLow = gapHigh;
  }
  return null;
}

/**
 * The grid convergence index of a quantity on three grids.
 *
 * @param values phi on the fine, the middle and the coarse grid
 * @param r21 refinement ratio from the middle to the fine grid, above 1
 * @param r32 refinement ratio from the coarse to the middle grid, above 1
 * @returns null where the index is undefined: two grids agree exactly, or no apparent order exists
 * @throws RangeError where a ratio is not above 1
 * @example gridConvergenceIndex([6.063, 5.972, 5.863], 1.5, 4 / 3)?.index // 0.02175
 * @see Celik, Ghia, Roache, Freitas, Coleman and Raad 2008, J. Fluids Eng. 130, 078001
 */
export function gridConvergenceIndex(
  values: readonly [number, number, number],
  r21: number,
  r32: number,
): GridConvergenceIndex | null {
  if (!(r21 > 1 && r32 > 1)) throw new RangeError(`Refinement ratios are above 1, not ${r21} and ${r32}`);
  const [fine, middle, coarse] = values;
  const e21 = middle - fine;
  const e32 = coarse - middle;
  if (e21 === 0 || e32 === 0 || fine === 0) return null;
  const sign = Math.sign(e32 / e21);
  const order = apparentOrder(e32 / e21, sign, r21, r32);
  if (order === null) return null;
  const gain = r21 ** order;
  const extrapolated = (gain * fine - middle) / (gain - 1);
  const approximateError = Math.abs(e21 / fine);
  return {
    order,
    extrapolated,
    approximateError,
    extrapolatedError: Math.abs((extrapolated - fine) / extrapolated),
    index: (1.25 * approximateError) / (gain - 1),
    isOscillatory: sign < 0,
  };
}
