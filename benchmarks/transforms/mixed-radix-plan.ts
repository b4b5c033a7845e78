import type { ComplexArray, FourierPlan } from "./fourier-plan";

const largestFactor = 13;

/**
 * The factors of a length, fours first, or null where a prime factor is above 13.
 *
 * @example smallFactors(24) // [4, 2, 3]
 * @see MixedRadixPlan
 */
export function smallFactors(n: number): number[] | null {
  const factors: number[] = [];
  let rest = n;
  for (const factor of [4, 2, 3, 5, 7, 11, largestFactor]) {
    while (rest % factor === 0) {
      factors.push(factor);
      rest /= factor;
    }
  }
  return rest === 1 ? factors : null;
}

/** One pass: groups of `radix` values are transformed together. */
interface Pass {
  radix: number;
  /** Product of the radices before. */
  done: number;
  /** exp(-2 pi i q j/(done radix)), j slowest. */
  twiddleRe: Float64Array;
  twiddleIm: Float64Array;
  /** exp(-2 pi i q p/radix). */
  rootRe: Float64Array;
  rootIm: Float64Array;
}

/**
 * A transform whose length has small prime factors, by passes that leave the coefficients in order.
 *
 * @example new MixedRadixPlan(24, [4, 2, 3]).forward(re, im)
 * @see C. Temperton, Self-sorting mixed-radix fast Fourier transforms, J. Comput. Phys. 52 (1983) 1-23
 */
export class MixedRadixPlan implements FourierPlan {
  private readonly passes: Pass[];

  constructor(
    private readonly n: number,
    factors: readonly number[],
  ) {
    let done = 1;
    this.passes = factors.map((radix) => {
      const pass = makePass(radix, done);
      done *= radix;
      return pass;
    });
  }

  forward(re: Float64Array, im: Float64Array): ComplexArray {
    let from: ComplexArray = { re: re.slice(), im: im.slice() };
    let to: ComplexArray = { re: new Float64Array(this.n), im: new Float64Array(this.n) };
    for (const pass of this.passes) {
      runPass(pass, this.n, from, to);
      [from, to] = [to, from];
    }
    return from;
  }
}

function makePass(radix: number, done: number): Pass {
  const table = (size: number, angle: (k: number) => number, f: (angle: number) => number) =>
    Float64Array.from({ length: size }, (_, k) => f(-2 * Math.PI * angle(k)));
  const twiddle = (k: number) => ((k % radix) * Math.floor(k / radix)) / (done * radix);
  const root = (k: number) => (((k % radix) * Math.floor(k / radix)) % radix) / radix;
  return {
    radix,
    done,
    twiddleRe: table(done * radix, twiddle, Math.cos),
    twiddleIm: table(done * radix, twiddle, Math.sin),
    rootRe: table(radix * radix, root, Math.cos),
    rootIm: table(radix * radix, root, Math.sin),
  };
}

function runPass(pass: Pass, n: number, from: ComplexArray, to: ComplexArray): void {
  const { radix, done, twiddleRe, twiddleIm } = pass;
  const rest = n / (done * radix);
  const stride = rest * done;
  const re = new Float64Array(radix);
  const im = new Float64Array(radix);
  for (let k = 0; k < rest; k++) {
    for (let j = 0; j < done; j++) {
      for (let q = 0; q < radix; q++) {
        const at = q * stride + k * done + j;
        const c = twiddleRe[j * radix + q];
        const s = twiddleIm[j * radix + q];
        const a = from.re[at];
        const b = from.im[at];
        re[q] = a * c - b * s;
        im[q] = a * s + b * c;
      }
      const outAt = k * done * radix + j;
      if (radix === 4) writeFour(re, im, to, outAt, done);
      else writeAny(pass, re, im, to, outAt);
    }
  }
}

function writeAny(pass: Pass, re: Float64Array, im: Float64Array, to: ComplexArray, at: number): void {
  const { radix, done, rootRe, rootIm } = pass;
  for (let p = 0; p < radix; p++) {
    let sumRe = re[0];
    let sumIm = im[0];
    for (let q = 1; q < radix; q++) {
      const c = rootRe[p * radix + q];
      const s = rootIm[p * radix + q];
      sumRe += re[q] * c - im[q] * s;
      sumIm += re[q] * s + im[q] * c;
    }
    to.re[at + p * done] = sumRe;
    to.im[at + p * done] = sumIm;
  }
}

/** Four values need additions alone. */
function writeFour(re: Float64Array, im: Float64Array, to: ComplexArray, at: number, step: number): void {
  const sumRe = re[0] + re[2];
  const sumIm = im[0] + im[2];
  const gapRe = re[0] - re[2];
  const gapIm = im[0] - im[2];
  const otherRe = re[1] + re[3];
  const otherIm = im[1] + im[3];
  const turnRe = im[1] - im[3];
  const turnIm = re[3] - re[1];
  to.re[at] = sumRe + otherRe;
  to.im[at] = sumIm + otherIm;
  to.re[at + step] = gapRe + turnRe;
  to.im[at + step] = gapIm + turnIm;
  to.re[at + 2 * step] = sumRe - otherRe;
  to.im[at + 2 * step] = sumIm - otherIm;
  to.re[at + 3 * step] = gapRe - turnRe;
  to.im[at + 3 * step] = gapIm - turnIm;
}
