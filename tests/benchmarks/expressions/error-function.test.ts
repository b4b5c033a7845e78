import { describe, expect, it } from "vitest";

import { erf, erfc } from "@/benchmarks/expressions/error-function";

const ulps = (found: number, expected: number) =>
  Math.abs(found - expected) / (Math.abs(expected) * 2 ** -52);

describe("the error function and its complement agree with 50-digit values", () => {
  // Computed with mpmath in 50-digit arithmetic; the first digits agree with Abramowitz and Stegun, table 7.1.
  it.each([
    [0.1, 0.1124629160182848922, 0.8875370839817151078],
    [0.5, 0.5204998778130465377, 0.4795001221869534623],
    [0.75, 0.7111556336535151316, 0.2888443663464848684],
    [1, 0.842700792949714869, 0.157299207050285131],
    [1.5, 0.9661051464753107271, 0.03389485352468927293],
    [2, 0.995322265018952734, 0.004677734981047265838],
    [3, 0.9999779095030014146, 2.209049699858544137e-5],
    [5, 0.99999999999846254, 1.53745979442803485e-12],
    [10, 1, 2.088487583762544757e-45],
    [20, 1, 5.395865611607900929e-176],
  ])("at %d", (x, plain, complement) => {
    expect(ulps(erf(x), plain)).toBeLessThanOrEqual(2);
    expect(ulps(erfc(x), complement)).toBeLessThanOrEqual(4);
    expect(erf(-x)).toBe(-erf(x));
    expect(ulps(erfc(-x), 1 + plain)).toBeLessThanOrEqual(2);
  });

  it("at zero, far out and where there is no number", () => {
    expect(erf(0)).toBe(0);
    expect(erfc(0)).toBe(1);
    expect(erf(Infinity)).toBe(1);
    expect(erfc(Infinity)).toBe(0);
    expect(erfc(-Infinity)).toBe(2);
    expect(erf(NaN)).toBeNaN();
    expect(erfc(NaN)).toBeNaN();
  });

  it("join without a gap where their expansions meet", () => {
    expect(Math.abs(erf(0.5) - erf(0.5 + 2 ** -53))).toBeLessThan(4e-16);
  });
});
