import { fourierTransform } from "./fourier-transform";

/**
 * Discrete cosine transform of the first kind: u_0 + (-1)^k u_N + 2 sum over j = 1..N-1 of u_j cos(pi j k/N).
 *
 * Applied twice it gives 2N times the data.
 *
 * @param values N+1 values, N at least 1
 * @returns N+1 coefficients, a new array
 * @throws RangeError where there are fewer than two values
 * @example cosineTransform(Float64Array.of(1, 1, 1)) // [4, 0, 0]
 * @see L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000, chapter 8 (from memory)
 */
export function cosineTransform(values: Float64Array): Float64Array {
  const n = values.length - 1;
  if (n < 1) throw new RangeError(`a cosine transform needs two values or more, not ${values.length}`);
  const even = new Float64Array(2 * n);
  even.set(values);
  for (let j = 1; j < n; j++) even[2 * n - j] = values[j];
  return fourierTransform(even, null).re.slice(0, n + 1);
}
