/** Weights of the Clenshaw-Curtis rule and of Fejer's first rule on [-1, 1]. */

import { fourierTransform, inverseFourierTransform } from "../transforms/fourier-transform";

/**
 * Weights of the Clenshaw-Curtis rule on the n points cos(pi j/(n-1)); exact to degree n - 1.
 *
 * The weights are the Fourier transform of the moments of the Chebyshev polynomials, O(n log n).
 *
 * @param n number of nodes, 2 or more
 * @returns n weights that sum to 2
 * @throws RangeError where n is not a whole number from 2 on
 * @example clenshawCurtisWeights(3) // [1/3, 4/3, 1/3]
 * @see Clenshaw and Curtis 1960, Numer. Math. 2; Waldvogel 2006, BIT 46
 */
export function clenshawCurtisWeights(n: number): Float64Array {
  if (!Number.isInteger(n) || n < 2)
    throw new RangeError(`Clenshaw-Curtis needs two nodes or more, not ${n}`);
  const intervals = n - 1;
  const moments = new Float64Array(intervals);
  moments[0] = 2;
  for (let j = 1; 2 * j <= intervals; j++) moments[j] = moments[intervals - j] = -2 / (4 * j * j - 1);
  const sums = fourierTransform(moments, null).re;
  const weights = new Float64Array(n);
  for (let k = 1; 2 * k <= intervals; k++) weights[k] = weights[intervals - k] = sums[k] / intervals;
  // Known in closed form, and small beside what a transform rounds.
  weights[0] = weights[intervals] = intervals % 2 === 0 ? 1 / (intervals ** 2 - 1) : 1 / intervals ** 2;
  return weights;
}

/**
 * Weights of Fejer's first rule on the n points cos(pi (2j+1)/(2n)); exact to degree n - 1.
 *
 * @param n number of nodes, 1 or more
 * @returns n weights that sum to 2
 * @throws RangeError where n is not a whole number from 1 on
 * @example fejerWeights(2) // [1, 1]
 * @see Fejer 1933, Math. Z. 37; Waldvogel 2006, BIT 46
 */
export function fejerWeights(n: number): Float64Array {
  if (!Number.isInteger(n) || n < 1) throw new RangeError(`Fejer's rule needs one node or more, not ${n}`);
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  re[0] = 2;
  for (let j = 1; 2 * j < n; j++) {
    const moment = -2 / (4 * j * j - 1);
    re[j] = re[n - j] = moment * Math.cos((Math.PI * j) / n);
    im[j] = moment * Math.sin((Math.PI * j) / n);
    im[n - j] = -im[j];
  }
  const sums = inverseFourierTransform(re, im).re;
  const weights = new Float64Array(n);
  for (let k = 0; 2 * k < n; k++) weights[k] = weights[n - 1 - k] = sums[k];
  return weights;
}
