/** Orders of accuracy between runs, and straight-line fits. */

/** A ratio of intervals that makes a pair of runs wide: 1.5 less 3 %. */
export const wideRatio = 1.455;

/**
 * The observed order between run j and the finer run k: ln(E_j/E_k) / ln(s_k/s_j).
 *
 * @param s intervals of each run, ascending
 * @param errors errors of each run, positive
 * @example observedOrder([10, 20], [4e-2, 1e-2], 0, 1) // 2
 * @see Roache 1998, chapter 5; Oberkampf and Roy 2010, section 5.3
 */
export function observedOrder(s: ArrayLike<number>, errors: ArrayLike<number>, j: number, k: number): number {
  return Math.log(errors[j] / errors[k]) / Math.log(s[k] / s[j]);
}

/** An order over a wide pair, and the coarser run of that pair. */
export interface WideOrder {
  order: number;
  from: number;
}

/**
 * The order into run k from the nearest run that is coarser by a ratio of about 1.5, so that close or zigzag
 * sequences do not mislead.
 *
 * @returns null where no run is coarse enough
 * @example wideOrder([10, 12, 20], [4e-2, 3e-2, 1e-2], 2) // { order: 2.15, from: 1 }
 * @see the rule that judges a refinement study, on the page /scoring
 */
export function wideOrder(s: ArrayLike<number>, errors: ArrayLike<number>, k: number): WideOrder | null {
  for (let j = k - 1; j >= 0; j--) {
    if (s[k] / s[j] >= wideRatio) return { order: observedOrder(s, errors, j, k), from: j };
  }
  return null;
}

/**
 * The least-squares line of y against x.
 *
 * @returns the sum of squared residuals, and the fall of y per unit of x (minus the slope)
 * @example fitLine([0, 1, 2], [5, 3, 1]) // { residual: 0, fall: 2 }
 * @see Press et al. 2007, section 15.2
 */
export function fitLine(x: ArrayLike<number>, y: ArrayLike<number>): { residual: number; fall: number } {
  const m = x.length;
  let meanX = 0;
  let meanY = 0;
  for (let i = 0; i < m; i++) {
    meanX += x[i] / m;
    meanY += y[i] / m;
  }
  let xy = 0;
  let xx = 0;
  for (let i = 0; i < m; i++) {
    xy += (x[i] - meanX) * (y[i] - meanY);
    xx += (x[i] - meanX) ** 2;
  }
  const slope = xy / xx;
  let residual = 0;
  for (let i = 0; i < m; i++) residual += (y[i] - meanY - slope * (x[i] - meanX)) ** 2;
  return { residual, fall: -slope };
}

/**
 * The median: the middle value, or the mean of the two middle ones.
 *
 * @example median([3, 1, 2, 10]) // 2.5
 * @see NumPy's `median`
 */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((p, q) => p - q);
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
}
