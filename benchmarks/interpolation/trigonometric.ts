/** The trigonometric interpolant of equally spaced periodic data. */

import { fourierTransform, inverseFourierTransform } from "../transforms/fourier-transform";

/** Where the data sit within their cells, and whether they are averages over them. */
export interface PeriodicSamples {
  /** Distance of the first node from the left end, in cells: 0, or 1/2 on cell-centred grids. */
  offset: number;
  /** The data are averages over cells about the nodes; the interpolant is of the point values. */
  isAverage: boolean;
}

/**
 * Values of the trigonometric interpolant at the M places (m + 1/2)/M of the period.
 *
 * The mode at N/2 of an even N counts half at each sign, so that real data have a real interpolant. Modes above M are
 * folded, which is exact at these places.
 *
 * @param values N values at (j + offset)/N of the period, any N
 * @param samples offset, and whether the values are cell averages
 * @param out receives M values
 * @returns out
 * @example trigonometricValues(u, { offset: 0, isAverage: false }, new Float64Array(1024))
 * @see Trefethen 2000, chapter 3 (band-limited interpolation)
 */
export function trigonometricValues(
  values: Float64Array,
  samples: PeriodicSamples,
  out: Float64Array,
): Float64Array {
  const n = values.length;
  const m = out.length;
  const spectrum = fourierTransform(values, null);
  const re = new Float64Array(m);
  const im = new Float64Array(m);
  const half = n / 2;
  const add = (k: number, real: number, imaginary: number) => {
    const angle = (Math.PI * k) / m - (2 * Math.PI * k * samples.offset) / n;
    const argument = (Math.PI * k) / n;
    const gain = samples.isAverage && k !== 0 ? argument / Math.sin(argument) : 1;
    const cosine = Math.cos(angle) * gain;
    const sine = Math.sin(angle) * gain;
    const bin = ((k % m) + m) % m;
    re[bin] += real * cosine - imaginary * sine;
    im[bin] += real * sine + imaginary * cosine;
  };
  for (let index = 0; index < n; index++) {
    const real = spectrum.re[index] / n;
    const imaginary = spectrum.im[index] / n;
    if (index === half) {
      add(half, real / 2, imaginary / 2);
      add(-half, real / 2, imaginary / 2);
    } else {
      add(index < half ? index : index - n, real, imaginary);
    }
  }
  const result = inverseFourierTransform(re, im).re;
  for (let i = 0; i < m; i++) out[i] = m * result[i];
  return out;
}
