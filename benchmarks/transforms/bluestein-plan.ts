import type { ComplexArray, FourierPlan } from "./fourier-plan";
import { PowerOfTwoPlan } from "./power-of-two-plan";

/** A transform of any length as a convolution with a chirp, carried out at a power of two. */
export class BluesteinPlan implements FourierPlan {
  private readonly size: number;
  private readonly cosine: Float64Array;
  private readonly sine: Float64Array;
  private readonly chirp: ComplexArray;
  private readonly convolution: PowerOfTwoPlan;

  constructor(private readonly n: number) {
    this.size = 2 ** Math.ceil(Math.log2(2 * n - 1));
    this.convolution = new PowerOfTwoPlan(this.size);
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
    this.chirp = this.convolution.forward(re, im);
  }

  forward(re: Float64Array, im: Float64Array): ComplexArray {
    const { n, size, cosine, sine } = this;
    const a = { re: new Float64Array(size), im: new Float64Array(size) };
    for (let j = 0; j < n; j++) {
      a.re[j] = re[j] * cosine[j] + im[j] * sine[j];
      a.im[j] = im[j] * cosine[j] - re[j] * sine[j];
    }
    const spectrum = this.convolution.forward(a.re, a.im);
    for (let k = 0; k < size; k++) {
      const real = spectrum.re[k] * this.chirp.re[k] - spectrum.im[k] * this.chirp.im[k];
      spectrum.im[k] = spectrum.re[k] * this.chirp.im[k] + spectrum.im[k] * this.chirp.re[k];
      spectrum.re[k] = real;
    }
    // Exchanging the parts turns the forward transform into the inverse one, but for the factor.
    const product = this.convolution.forward(spectrum.im, spectrum.re);
    const result = { re: new Float64Array(n), im: new Float64Array(n) };
    for (let k = 0; k < n; k++) {
      result.re[k] = (product.im[k] * cosine[k] + product.re[k] * sine[k]) / size;
      result.im[k] = (product.re[k] * cosine[k] - product.im[k] * sine[k]) / size;
    }
    return result;
  }
}
