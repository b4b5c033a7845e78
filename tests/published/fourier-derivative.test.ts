import { describe, expect, it } from "vitest";

import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import {
  centralScheme,
  fourierScheme,
  type PeriodicScheme,
  periodicOperators,
} from "@/benchmarks/solvers/periodic-scheme";

const period = 2 * Math.PI;

function largestErrorOfDerivative(scheme: PeriodicScheme, n: number): number {
  const x = nodesOf("uniform-periodic", n, 0, period);
  const out = new Float64Array(n);
  periodicOperators(scheme, n, period / n).first.apply(
    x.map((s) => Math.exp(Math.sin(s))),
    out,
  );
  return out.reduce(
    (largest, value, j) => Math.max(largest, Math.abs(value - Math.cos(x[j]) * Math.exp(Math.sin(x[j])))),
    0,
  );
}

describe("the Fourier derivative of exp(sin x) has the known errors", () => {
  // Exact-arithmetic errors, 50 digits, for programs 4 and 5 of Trefethen, Spectral Methods in MATLAB, SIAM, 2000.
  it.each([
    [8, 0.00431791109859],
    [12, 3.82490955645e-5],
    [16, 1.76189312394e-7],
    [20, 4.98794018042e-10],
  ])("on %i nodes", (n, expected) => {
    const error = largestErrorOfDerivative(fourierScheme, n);
    expect(Math.abs(error - expected)).toBeLessThan(1e-6 * expected + 1e-14);
  });

  // Trefethen prints about 9.57e-13 (from memory); rounding changes the digits here.
  it("on 24 nodes within a factor of two of 9.57e-13", () => {
    const error = largestErrorOfDerivative(fourierScheme, 24);
    expect(error).toBeGreaterThan(9.56766426494e-13 / 2);
    expect(error).toBeLessThan(9.56766426494e-13 * 2);
  });

  it.each([28, 32, 40])("stays on round-off on %i nodes", (n) => {
    expect(largestErrorOfDerivative(fourierScheme, n)).toBeLessThan(1e-12);
  });
});

describe("central differences of exp(sin x) have the known errors", () => {
  // Trefethen 2000, programs 1 and 2 (the figure's function; values computed in double precision).
  it.each([
    [2, 16, 9.3588594739e-2],
    [2, 32, 2.5832519819e-2],
    [2, 64, 6.511804023e-3],
    [2, 128, 1.6313294595e-3],
    [4, 16, 1.5750384327e-2],
    [4, 32, 1.1318272934e-3],
    [4, 64, 7.5899669618e-5],
    [4, 128, 4.782857006e-6],
    [6, 16, 4.3919105587e-3],
    [6, 32, 9.3122795564e-5],
    [6, 64, 1.5768588352e-6],
    [6, 128, 2.5145396765e-8],
    [8, 16, 1.5979179877e-3],
    [8, 32, 1.0664758464e-5],
    [8, 64, 4.8176150402e-8],
    [8, 128, 2.0017831837e-10],
  ])("order %i on %i nodes", (order, n, expected) => {
    const error = largestErrorOfDerivative(centralScheme(order), n);
    expect(Math.abs(error - expected)).toBeLessThan(1e-7 * expected + 2e-14 * n);
  });
});

describe("Fourier differentiation matrices have the known first columns", () => {
  // Trefethen 2000, chapter 3 (from memory); verified against the band-limited interpolant in 30 digits.
  const s3 = Math.sqrt(3);
  const s5 = Math.sqrt(5);
  const [wide, narrow] = [Math.sqrt(s5 / 10 + 1 / 2), Math.sqrt(1 / 2 - s5 / 10)];
  it.each([
    { n: 4, first: [0, -1 / 2, 0, 1 / 2], second: [-3 / 2, 1, -1 / 2, 1] },
    {
      n: 6,
      first: [0, -s3 / 2, s3 / 6, 0, -s3 / 6, s3 / 2],
      second: [-19 / 6, 2, -2 / 3, 1 / 2, -2 / 3, 2],
    },
    {
      n: 5,
      first: [0, -wide, narrow, -narrow, wide],
      second: [
        -2,
        1 / 2 + (3 * s5) / 10,
        1 / 2 - (3 * s5) / 10,
        1 / 2 - (3 * s5) / 10,
        1 / 2 + (3 * s5) / 10,
      ],
    },
  ])("of $n nodes", ({ n, first, second }) => {
    const unit = new Float64Array(n);
    unit[0] = 1;
    const operators = periodicOperators(fourierScheme, n, period / n);
    const column = new Float64Array(n);
    operators.first.apply(unit, column);
    first.forEach((value, j) => expect(Math.abs(column[j] - value)).toBeLessThan(1e-14));
    operators.second.apply(unit, column);
    second.forEach((value, j) => expect(Math.abs(column[j] - value)).toBeLessThan(1e-14));
  });
});
