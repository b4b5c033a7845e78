/** Weights of the Clenshaw-Curtis rule and of Fejer's first rule on [-1, 1]. */

/**
 * sum over j = 0..m of c_j cos(2 pi j k / n + j shift), for one k.
 *
 * The angle is reduced in whole numbers, so that it loses no digits for large j k.
 */
function cosineSum(coefficients: Float64Array, k: number, n: number): number {
  let sum = 0;
  for (let j = coefficients.length - 1; j >= 0; j--) {
    sum += coefficients[j] * Math.cos((2 * Math.PI * ((j * k) % n)) / n);
  }
  return sum;
}

/**
 * Weights of the Clenshaw-Curtis rule on the n points cos(pi j/(n-1)); exact to degree n - 1.
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
  const coefficients = new Float64Array(Math.floor(intervals / 2) + 1);
  coefficients[0] = 1;
  for (let j = 1; j < coefficients.length; j++) {
    coefficients[j] = (2 * j === intervals ? -1 : -2) / (4 * j * j - 1);
  }
  const weights = new Float64Array(n);
  for (let k = 0; 2 * k <= intervals; k++) {
    const weight = ((k === 0 ? 1 : 2) / intervals) * cosineSum(coefficients, k, intervals);
    weights[k] = weights[intervals - k] = weight;
  }
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
  const coefficients = new Float64Array(Math.floor((n - 1) / 2) + 1);
  coefficients[0] = 1;
  for (let j = 1; j < coefficients.length; j++) coefficients[j] = -2 / (4 * j * j - 1);
  const weights = new Float64Array(n);
  for (let k = 0; 2 * k < n; k++) {
    weights[k] = weights[n - 1 - k] = (2 / n) * cosineSum(coefficients, 2 * k + 1, 2 * n);
  }
  return weights;
}
