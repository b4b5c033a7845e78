import { describe, expect, it } from "vitest";

import { cosineTransform } from "@/benchmarks/transforms/cosine-transform";
import {
  fourierTransform,
  fourierTransform2d,
  inverseFourierTransform,
  modeNumbers,
} from "@/benchmarks/transforms/fourier-transform";

const lengths = [1, 2, 3, 4, 5, 7, 8, 12, 24, 31, 48, 97, 128, 1000];
const values = (n: number, seed: number) =>
  Float64Array.from({ length: n }, (_, j) => Math.sin(seed + 1.7 * j * j));

function largestGap(a: Float64Array, b: Float64Array): number {
  return a.reduce((most, value, j) => Math.max(most, Math.abs(value - b[j])), 0);
}

describe("the Fourier transform of any length", () => {
  it.each(lengths)("is the sum that defines it, on %i values", (n) => {
    const [re, im] = [values(n, 1), values(n, 2)];
    const found = fourierTransform(re, im);
    const expected = { re: new Float64Array(n), im: new Float64Array(n) };
    for (let k = 0; k < n; k++) {
      for (let j = 0; j < n; j++) {
        const angle = (-2 * Math.PI * ((j * k) % n)) / n;
        expected.re[k] += re[j] * Math.cos(angle) - im[j] * Math.sin(angle);
        expected.im[k] += re[j] * Math.sin(angle) + im[j] * Math.cos(angle);
      }
    }
    expect(largestGap(found.re, expected.re)).toBeLessThan(4 * n * Number.EPSILON);
    expect(largestGap(found.im, expected.im)).toBeLessThan(4 * n * Number.EPSILON);
  });

  it.each(lengths)("is undone by its inverse, on %i values", (n) => {
    const [re, im] = [values(n, 3), values(n, 4)];
    const modes = fourierTransform(re, im);
    const back = inverseFourierTransform(modes.re, modes.im);
    expect(largestGap(back.re, re)).toBeLessThan(32 * Number.EPSILON);
    expect(largestGap(back.im, im)).toBeLessThan(32 * Number.EPSILON);
  });

  it("numbers the modes with their signs, the highest of an even length positive", () => {
    expect([...modeNumbers(5)]).toEqual([0, 1, 2, -2, -1]);
    expect([...modeNumbers(6)]).toEqual([0, 1, 2, 3, -2, -1]);
  });

  it("refuses parts of different lengths and no values", () => {
    expect(() => fourierTransform(new Float64Array(3), new Float64Array(4))).toThrow(RangeError);
    expect(() => fourierTransform(new Float64Array(0), null)).toThrow(RangeError);
  });
});

it("puts a plane wave into one mode of the two-dimensional transform", () => {
  const [rows, columns] = [6, 10];
  const wave = { re: new Float64Array(60), im: new Float64Array(60) };
  for (let i = 0; i < rows; i++) {
    for (let j = 0; j < columns; j++) {
      const angle = 2 * Math.PI * ((2 * i) / rows + (3 * j) / columns);
      wave.re[i * columns + j] = Math.cos(angle);
      wave.im[i * columns + j] = Math.sin(angle);
    }
  }
  const modes = fourierTransform2d(wave, [rows, columns], false);
  const expected = new Float64Array(60);
  expected[2 * columns + 3] = 60;
  expect(largestGap(modes.re, expected)).toBeLessThan(1e-13);
  expect(largestGap(modes.im, new Float64Array(60))).toBeLessThan(1e-13);
  expect(largestGap(fourierTransform2d(modes, [rows, columns], true).re, wave.re)).toBeLessThan(1e-14);
});

describe("the cosine transform", () => {
  it.each([1, 2, 7, 16])("finds the cosine of each order on %i intervals", (n) => {
    for (let k = 0; k <= n; k++) {
      const wave = Float64Array.from({ length: n + 1 }, (_, j) => Math.cos((Math.PI * j * k) / n));
      const expected = new Float64Array(n + 1);
      expected[k] = k === 0 || k === n ? 2 * n : n;
      expect(largestGap(cosineTransform(wave), expected)).toBeLessThan(8 * (n + 1) * Number.EPSILON);
    }
  });

  it("applied twice gives the data times twice the intervals", () => {
    const u = values(14, 5);
    expect(
      largestGap(
        cosineTransform(cosineTransform(u)),
        u.map((value) => 26 * value),
      ),
    ).toBeLessThan(1e-13);
  });

  it("refuses fewer than two values", () => {
    expect(() => cosineTransform(new Float64Array(1))).toThrow(RangeError);
  });
});
