import { describe, expect, it } from "vitest";
import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { ErrorSums } from "@/benchmarks/norms/error-sums";
import { findNonFinite } from "@/benchmarks/norms/finite-values";

const eps = 2 ** -52;
const real = (values: Float64Array) => ({ values, imaginary: null });

/** Values without a pattern, the same in every run. */
function scattered(n: number, seed: number): Float64Array {
  let state = seed;
  return Float64Array.from({ length: n }, () => {
    state = (state * 1103515245 + 12345) % 2147483648;
    return state / 1073741824 - 1;
  });
}

describe("norms of gridded errors", () => {
  it("are what the definitions say on a small example", () => {
    const sums = sumErrors(real(Float64Array.of(1, 2, 4)), real(Float64Array.of(1, 1, 1)), [
      Float64Array.of(0.5, 1, 0.5),
    ]);
    expect(normsOf([sums])).toEqual({
      l1: 2.5,
      l2: Math.sqrt(5.5),
      max: 3,
      relL1: 1.25,
      relL2: Math.sqrt(5.5) / Math.sqrt(2),
      relMax: 3,
    });
    expect(sums.defect).toBe(2.5);
  });

  it("do not depend on how a field is cut into pieces beyond 1e-14", () => {
    const n = 100_000;
    const [u, exact] = [scattered(n, 1), scattered(n, 2)];
    const weights = new Float64Array(n).fill(1 / n);
    const whole = normsOf([sumErrors(real(u), real(exact), [weights])]);
    for (const piece of [1, 7, 100, 4096]) {
      const sums = new ErrorSums();
      for (let from = 0; from < n; from += piece)
        sums.add(u, exact, weights.subarray(from, from + piece), from);
      const cut = normsOf([sums]);
      for (const key of ["l1", "l2", "relL1", "relL2"] as const) {
        expect(Math.abs((cut[key] ?? 0) / (whole[key] ?? 1) - 1)).toBeLessThanOrEqual(1e-14);
      }
      expect(cut.max).toBe(whole.max);
    }
  });

  it("keep small errors beside large ones: a sum over a million nodes is exact to 1e-14", () => {
    const n = 2 ** 20;
    const u = new Float64Array(n).fill(0.1);
    const sums = sumErrors(real(u), real(new Float64Array(n)), [new Float64Array(n).fill(1)]);
    expect(Math.abs(sums.errorL1 / (0.1 * n) - 1)).toBeLessThanOrEqual(1e-14);
  });

  it("of a tensor grid weight each axis", () => {
    const u = Float64Array.of(1, 1, 1, 1, 1, 1);
    const sums = sumErrors(real(u), real(new Float64Array(6)), [
      Float64Array.of(1, 3),
      Float64Array.of(1, 2, 4),
    ]);
    expect(sums.errorL1).toBe(28);
    expect(sums.exactL1).toBe(0);
  });

  it("take the modulus of complex errors, and agree with the real ones where the imaginary part is zero", () => {
    const n = 300;
    const [u, exact] = [scattered(n, 3), scattered(n, 4)];
    const weights = new Float64Array(n).fill(0.5);
    const zero = new Float64Array(n);
    const asReal = normsOf([sumErrors(real(u), real(exact), [weights])]);
    const asComplex = normsOf([sumErrors({ values: u, imaginary: zero }, real(exact), [weights])]);
    for (const key of ["l1", "l2", "max"] as const) {
      expect(Math.abs(asComplex[key] - asReal[key])).toBeLessThanOrEqual(8 * eps * asReal[key]);
    }
    const rotated = sumErrors(
      { values: Float64Array.of(3), imaginary: Float64Array.of(4) },
      { values: Float64Array.of(0), imaginary: Float64Array.of(0) },
      [Float64Array.of(1)],
    );
    expect(normsOf([rotated]).max).toBe(5);
  });

  it("of several fields combine: L1 by sum, L2 by root of squares, max by the largest", () => {
    const one = sumErrors(real(Float64Array.of(3)), real(Float64Array.of(1)), [Float64Array.of(1)]);
    const two = sumErrors(real(Float64Array.of(4)), real(Float64Array.of(2.5)), [Float64Array.of(1)]);
    const norms = normsOf([one, two]);
    expect([norms.l1, norms.l2, norms.max]).toEqual([3.5, 2.5, 2]);
    expect(norms.relMax).toBe(2 / 2.5);
  });

  it("have no relative form where the exact solution vanishes", () => {
    const norms = normsOf([
      sumErrors(real(Float64Array.of(1)), real(Float64Array.of(0)), [Float64Array.of(1)]),
    ]);
    expect([norms.relL1, norms.relL2, norms.relMax]).toEqual([null, null, null]);
  });

  it("refuse values that do not fill the grid", () => {
    expect(() =>
      sumErrors(real(new Float64Array(3)), real(new Float64Array(4)), [new Float64Array(4)]),
    ).toThrow(RangeError);
  });
});

describe("values that are not finite", () => {
  it("are found with the first index and their number", () => {
    expect(findNonFinite(Float64Array.of(1, NaN, 2, -Infinity))).toEqual({ index: 1, count: 2 });
    expect(findNonFinite(Float64Array.of(1e308, -1e308, 0))).toBeNull();
  });
});
