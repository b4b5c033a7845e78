/** Monotone piecewise cubic interpolation. */

/**
 * Slopes of the monotone cubic through (x, y) at its points: the weighted harmonic mean of the neighbouring secants,
 * zero at local extremes, one-sided three-point formulas (limited) at the ends.
 *
 * @param x abscissae, strictly ascending, two or more
 * @param y ordinates
 * @returns one slope for each point; two points give the straight line
 * @throws RangeError where there are fewer than two points or the lengths differ
 * @example monotoneSlopes([0, 1, 2], [0, 1, 4]) // [0, 1.5, 4]
 * @see Fritsch and Carlson 1980, SIAM J. Numer. Anal. 17; Fritsch and Butland 1984; SciPy's PchipInterpolator
 */
export function monotoneSlopes(x: readonly number[], y: readonly number[]): number[] {
  const m = x.length;
  if (m < 2 || y.length !== m) {
    throw new RangeError(
      `An interpolant needs two points or more with one ordinate each, not ${m} and ${y.length}`,
    );
  }
  const h: number[] = [];
  const secant: number[] = [];
  for (let k = 0; k < m - 1; k++) {
    h.push(x[k + 1] - x[k]);
    secant.push((y[k + 1] - y[k]) / (x[k + 1] - x[k]));
  }
  if (m === 2) return [secant[0], secant[0]];
  const slopes = [endSlope(h[0], h[1], secant[0], secant[1])];
  for (let k = 1; k < m - 1; k++) {
    if (!(secant[k - 1] * secant[k] > 0)) {
      slopes.push(0);
      continue;
    }
    const w1 = 2 * h[k] + h[k - 1];
    const w2 = h[k] + 2 * h[k - 1];
    slopes.push((w1 + w2) / (w1 / secant[k - 1] + w2 / secant[k]));
  }
  slopes.push(endSlope(h[m - 2], h[m - 3], secant[m - 2], secant[m - 3]));
  return slopes;
}

/** Three-point end formula, kept from overshooting. */
function endSlope(h0: number, h1: number, d0: number, d1: number): number {
  const slope = ((2 * h0 + h1) * d0 - h0 * d1) / (h0 + h1);
  if (slope * d0 <= 0) return 0;
  if (d0 * d1 <= 0 && Math.abs(slope) > 3 * Math.abs(d0)) return 3 * d0;
  return slope;
}

/**
 * The cubic Hermite interpolant at one place.
 *
 * @param x abscissae, strictly ascending
 * @param y ordinates
 * @param slopes slopes at the points, from `monotoneSlopes`
 * @param at place of evaluation, within [x_0, x_(m-1)]
 * @example hermiteValue([0, 1], [0, 1], [1, 1], 0.5) // 0.5
 * @see Fritsch and Carlson 1980
 */
export function hermiteValue(
  x: readonly number[],
  y: readonly number[],
  slopes: readonly number[],
  at: number,
): number {
  let k = 0;
  while (k < x.length - 2 && at > x[k + 1]) k++;
  const h = x[k + 1] - x[k];
  const p = (at - x[k]) / h;
  const q = 1 - p;
  return (
    y[k] * q * q * (1 + 2 * p) +
    y[k + 1] * p * p * (1 + 2 * q) +
    h * p * q * (slopes[k] * q - slopes[k + 1] * p)
  );
}

/**
 * The place within one interval at which a falling interpolant takes a value, by bisection.
 *
 * @param k the interval [x_k, x_(k+1)], with y_k >= value >= y_(k+1)
 * @returns the place, to rounding
 * @example invertFalling([0, 1], [1, 0], [-1, -1], 0, 0.25) // 0.75
 * @see Press et al. 2007, section 9.1 (bisection)
 */
export function invertFalling(
  x: readonly number[],
  y: readonly number[],
  slopes: readonly number[],
  k: number,
  value: number,
): number {
  const xs = x.slice(k, k + 2);
  const ys = y.slice(k, k + 2);
  const ends = slopes.slice(k, k + 2);
  if (value <= ys[1]) return xs[1];
  let low = xs[0];
  let high = xs[1];
  for (let step = 0; step < 200; step++) {
    const middle = low + (high - low) / 2;
    if (middle <= low || middle >= high) break;
    if (hermiteValue(xs, ys, ends, middle) > value) low = middle;
    else high = middle;
  }
  return high;
}
