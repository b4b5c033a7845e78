import { describe, expect, it } from "vitest";
import { hermiteValue, invertFalling, monotoneSlopes } from "@/benchmarks/interpolation/monotone-cubic";

describe("the monotone cubic", () => {
  it("has the slopes that the formulas give by hand", () => {
    // Secants 1 and 3 over equal steps: harmonic mean 2*3/(1 + 3) = 1.5; ends (3*1 - 3)/2 = 0 and (3*3 - 1)/2 = 4.
    expect(monotoneSlopes([0, 1, 2], [0, 1, 4])).toEqual([0, 1.5, 4]);
    // Steps 1 and 2, secants -2 and -0.5: w1 = 5, w2 = 4, slope 9/(5/-2 + 4/-0.5) = -6/7.
    const [first, middle, last] = monotoneSlopes([0, 1, 3], [4, 2, 1]);
    expect(first).toBeCloseTo((2 * 1 + 2) * (-2 / 3) + 0.5 / 3, 14);
    expect(middle).toBeCloseTo(-6 / 7, 14);
    // End: ((2*2 + 1)(-0.5) - 2(-2))/3 = 0.5 has the wrong sign, so it is 0.
    expect(last).toBe(0);
  });

  it("agrees with SciPy's PchipInterpolator on uneven points", () => {
    // SciPy 1.17.1: PchipInterpolator([0, 0.4, 1.1, 1.3, 2.5], [0, -1, -1.2, -4, -9])([0.2, 0.9, 1.2, 2]).
    const x = [0, 0.4, 1.1, 1.3, 2.5];
    const y = [0, -1, -1.2, -4, -9];
    const slopes = monotoneSlopes(x, y);
    const expected = [-0.6376215493049664, -1.113413573263845, -2.4327241183008463, -8.015129880381886];
    [0.2, 0.9, 1.2, 2].forEach((at, k) =>
      expect(hermiteValue(x, y, slopes, at)).toBeCloseTo(expected[k], 13),
    );
  });

  it("is a straight line through two points", () => {
    const slopes = monotoneSlopes([1, 3], [5, 1]);
    expect(hermiteValue([1, 3], [5, 1], slopes, 2)).toBe(3);
  });

  it("falls wherever the points fall, and its inverse takes each value back", () => {
    const x = [0, 0.5, 0.7, 2, 2.1];
    const y = [3, 2.9, -4, -4.1, -20];
    const slopes = monotoneSlopes(x, y);
    let before = Infinity;
    for (let at = 0; at <= 2.1; at += 0.003) {
      const value = hermiteValue(x, y, slopes, at);
      expect(value).toBeLessThanOrEqual(before + 1e-12);
      before = value;
    }
    for (const value of [2.95, 0, -4.05, -10]) {
      const k = y.findIndex((_, i) => y[i] >= value && y[i + 1] <= value);
      expect(hermiteValue(x, y, slopes, invertFalling(x, y, slopes, k, value))).toBeCloseTo(value, 10);
    }
  });

  it("needs two points", () => {
    expect(() => monotoneSlopes([1], [1])).toThrow(RangeError);
  });
});
