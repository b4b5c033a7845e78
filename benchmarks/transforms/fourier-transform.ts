import FFT from "fft.js";

/** Complex values as two arrays of the same length. */
export interface ComplexArray {
  re: Float64Array;
  im: Float64Array;
}

/** Transforms of one length, with what they need computed once. */
interface Plan {
  forward(re: Float64Array, im: Float64Array): ComplexArray;
}

const plans = new Map<number, Plan>();
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

function planOf(n: number): Plan {
  const found = plans.get(n);
  if (found) return found;
  if (plans.size >= mostPlans) plans.clear();
  const isPowerOfTwo = (n & (n - 1)) === 0;
  const plan = n === 1 ? new CopyPlan() : isPowerOfTwo ? new PowerOfTwoPlan(n) : new BluesteinPlan(n);
  plans.set(n, plan);
  return plan;
}

class CopyPlan implements Plan {
  forward(re: Float64Array, im: Float64Array): ComplexArray {
    return { re: re.slice(), im: im.slice() };
  }
}

class PowerOfTwoPlan implements Plan {
  private readonly fft: FFT;
  private readonly input: number[];
  private readonly output: number[];

  constructor(private readonly n: number) {
    this.fft = new FFT(n);
    this.input = this.fft.createComplexArray();
    this.output = this.fft.createComplexArray();
  }

  forward(re: Float64Array, im: Float64Array): ComplexArray {
    const { n, input, output } = this;
    for (let j = 0; j < n; j++) {
      input[2 * j] = re[j];
      input[2 * j + 1] = im[j];
    }
    this.fft.transform(output, input);
    const result = { re: new Float64Array(n), im: new Float64Array(n) };
    for (let k = 0; k < n; k++) {
      result.re[k] = output[2 * k];
      result.im[k] = output[2 * k + 1];
    }
    return result;
  }
}

/** A transform of any length as a convolution with a chirp, carried out at a power of two. */
class BluesteinPlan implements Plan {
  private readonly size: number;
  private readonly cosine: Float64Array;
  private readonly sine: Float64Array;
  private readonly chirp: ComplexArray;

  constructor(private readonly n: number) {
    this.size = 2 ** Math.ceil(Math.log2(2 * n - 1));
    this.cosine = new Float64Array(n);
    this.sine = new Float64Array(n);
    const re = new Float64Array(this.size);
    const im = new Float64Array(this.size);
    for (let j = 0; j < n; j++) {
      // j^2 modulo 2n keeps the angle small, and with it its rounding.
      const angle = (Math.PI * ((j * j) % (2 * n))) / n;
      this.cosine[j] = Math.cos(angle);
      this.sine[j] = Math.sin(angle);
      re[j] = re[(this.size - j) % this.size] = this.cosine[j];
      im[j] = im[(this.size - j) % this.size] = this.sine[j];
    }
    this.chirp = fourierTransform(re, im);
  }

  forward(re: Float64Array, im: Float64Array): ComplexArray {
    const { n, size, cosine, sine } = this;
    const a = { re: new Float64Array(size), im: new Float64Array(size) };
    for (let j = 0; j < n; j++) {
      a.re[j] = re[j] * cosine[j] + im[j] * sine[j];
      a.im[j] = im[j] * cosine[j] - re[j] * sine[j];
    }
    const spectrum = fourierTransform(a.re, a.im);
    for (let k = 0; k < size; k++) {
      const real = spectrum.re[k] * this.chirp.re[k] - spectrum.im[k] * this.chirp.im[k];
      spectrum.im[k] = spectrum.re[k] * this.chirp.im[k] + spectrum.im[k] * this.chirp.re[k];
      spectrum.re[k] = real;
    }
    const product = inverseFourierTransform(spectrum.re, spectrum.im);
    const result = { re: new Float64Array(n), im: new Float64Array(n) };
    for (let k = 0; k < n; k++) {
      result.re[k] = product.re[k] * cosine[k] + product.im[k] * sine[k];
      result.im[k] = product.im[k] * cosine[k] - product.re[k] * sine[k];
    }
    return result;
  }
}
