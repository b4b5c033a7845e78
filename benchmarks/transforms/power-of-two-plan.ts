import FFT from "fft.js";

import type { ComplexArray, FourierPlan } from "./fourier-plan";

/**
 * A transform whose length is a power of two, 2 or more.
 *
 * @example new PowerOfTwoPlan(8).forward(re, im)
 * @see F. Indutny, fft.js, https://github.com/indutny/fft.js (radix 4)
 */
export class PowerOfTwoPlan implements FourierPlan {
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
