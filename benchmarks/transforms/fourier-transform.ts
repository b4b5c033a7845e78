import { BluesteinPlan } from "./bluestein-plan";
import type { ComplexArray, FourierPlan } from "./fourier-plan";
import { MixedRadixPlan, smallFactors } from "./mixed-radix-plan";
import { PowerOfTwoPlan } from "./power-of-two-plan";

const plans = new Map<number, FourierPlan>();
const mostPlans = 64;

/**
 * Discrete Fourier transform of any length: sum over j of u_j exp(-2 pi i j k/N), k = 0..N-1.
 *
 * @param re N real parts
 * @param im N imaginary parts; null where the data are real
 * @returns N coefficients, new arrays; mode k above N/2 stands for k - N
 * @throws RangeError where the two parts differ in length or are empty
 * @example fourierTransform(Float64Array.of(1, 1, 1, 1), null).re // [4, 0, 0, 0]
 * @see L. I. Bluestein, A linear filtering approach to the computation of discrete Fourier transform, IEEE Trans.
 *   Audio Electroacoust. 18 (1970) 451-455 (lengths that are no powers of two)
 */
export function fourierTransform(re: Float64Array, im: Float64Array | null): ComplexArray {
  const n = re.length;
  if (n === 0 || (im && im.length !== n)) {
    throw new RangeError(`a transform needs parts of one length from 1 on, not ${n} and ${im?.length ?? n}`);
  }
  return planOf(n).forward(re, im ?? new Float64Array(n));
}

/**
 * Inverse discrete Fourier transform of any length, with the factor 1/N.
 *
 * @param re N real parts of the coefficients
 * @param im N imaginary parts; null where the coefficients are real
 * @returns N values, new arrays
 * @throws RangeError where the two parts differ in length or are empty
 * @example inverseFourierTransform(Float64Array.of(4, 0, 0, 0), null).re // [1, 1, 1, 1]
 * @see fourierTransform
 */
export function inverseFourierTransform(re: Float64Array, im: Float64Array | null): ComplexArray {
  const n = re.length;
  const exchanged = fourierTransform(im ?? new Float64Array(n), re);
  return { re: scaled(exchanged.im, 1 / n), im: scaled(exchanged.re, 1 / n) };
}

/**
 * Two-dimensional discrete Fourier transform of a row-major array, any lengths.
 *
 * @param values n0 times n1 complex values, first axis slowest
 * @param shape [n0, n1]
 * @param isInverse with the factor 1/(n0 n1)
 * @returns coefficients in the same layout, new arrays
 * @throws RangeError where the shape does not fit
 * @example fourierTransform2d({ re, im }, [8, 8], false)
 * @see fourierTransform
 */
export function fourierTransform2d(
  values: ComplexArray,
  shape: readonly [number, number],
  isInverse: boolean,
): ComplexArray {
  const [rows, columns] = shape;
  if (values.re.length !== rows * columns || values.im.length !== rows * columns) {
    throw new RangeError(`a shape of ${rows} by ${columns} does not fit ${values.re.length} values`);
  }
  const transform = isInverse ? inverseFourierTransform : fourierTransform;
  const out = { re: new Float64Array(rows * columns), im: new Float64Array(rows * columns) };
  for (let i = 0; i < rows; i++) {
    const at = i * columns;
    const row = transform(values.re.subarray(at, at + columns), values.im.subarray(at, at + columns));
    out.re.set(row.re, at);
    out.im.set(row.im, at);
  }
  const column = { re: new Float64Array(rows), im: new Float64Array(rows) };
  for (let j = 0; j < columns; j++) {
    for (let i = 0; i < rows; i++) {
      column.re[i] = out.re[i * columns + j];
      column.im[i] = out.im[i * columns + j];
    }
    const result = transform(column.re, column.im);
    for (let i = 0; i < rows; i++) {
      out.re[i * columns + j] = result.re[i];
      out.im[i * columns + j] = result.im[i];
    }
  }
  return out;
}

/**
 * The signed wavenumber index of each coefficient: 0, 1, ..., then negative; N/2 of an even length stays positive.
 *
 * @param n length of the transform
 * @example modeNumbers(4) // [0, 1, 2, -1]
 * @see Trefethen 2000, chapter 3
 */
export function modeNumbers(n: number): Float64Array {
  return Float64Array.from({ length: n }, (_, k) => (k <= n / 2 ? k : k - n));
}

function scaled(values: Float64Array, factor: number): Float64Array {
  for (let j = 0; j < values.length; j++) values[j] *= factor;
  return values;
}

function planOf(n: number): FourierPlan {
  const found = plans.get(n);
  if (found) return found;
  if (plans.size >= mostPlans) plans.clear();
  const plan = makePlan(n);
  plans.set(n, plan);
  return plan;
}

function makePlan(n: number): FourierPlan {
  if (n === 1) return new CopyPlan();
  if ((n & (n - 1)) === 0) return new PowerOfTwoPlan(n);
  const factors = smallFactors(n);
  return factors ? new MixedRadixPlan(n, factors) : new BluesteinPlan(n);
}

class CopyPlan implements FourierPlan {
  forward(re: Float64Array, im: Float64Array): ComplexArray {
    return { re: re.slice(), im: im.slice() };
  }
}
