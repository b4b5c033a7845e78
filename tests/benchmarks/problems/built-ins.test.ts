import { describe, expect, it } from "vitest";

import { airyTaylor } from "@/benchmarks/problems/airy-function";
import { builtIn } from "@/benchmarks/problems/built-ins";
import { shippedProblem } from "@/benchmarks/problems/catalogue";
import { proveConsistency } from "@/benchmarks/problems/consistency-proof";
import { typesetProblem } from "@/benchmarks/problems/typeset";

describe("the Airy function", () => {
  // DLMF, section 9.2: Ai(0) = 3^(-2/3)/Gamma(2/3), Ai'(0) = -3^(-1/3)/Gamma(1/3); zeros a_1, a_2 from table 9.9.1 (from
  // memory). The other values were computed in 40-digit arithmetic.
  it.each([
    [0, 0.35502805388781724, -0.2588194037928068],
    [1.25, 0.09964454475691667, -0.12648662068538938],
    [-2.25, 0.06159865877700528, 0.6950162067015287],
    [8.3, 1.9748617496676933e-8, -5.747539736338009e-8],
  ])("has its value and slope at %d", (z, value, slope) => {
    const [found, derivative] = airyTaylor(z, 1);
    expect(Math.abs(found - value)).toBeLessThan(1e-15 + 1e-13 * Math.abs(value));
    expect(Math.abs(derivative - slope)).toBeLessThan(1e-15 + 1e-13 * Math.abs(slope));
  });

  it.each([-2.338107410459767, -4.08794944413097])("vanishes at its zero %d", (zero) => {
    expect(Math.abs(airyTaylor(zero, 0)[0])).toBeLessThan(2e-15);
  });

  it("does not answer outside its table", () => {
    expect(() => airyTaylor(9, 0)).toThrow(RangeError);
  });
});

it("a built-in solution with another equation is rejected", () => {
  const problem = structuredClone(shippedProblem("airy-oscillatory"));
  problem.equations[0].identity = "u_xx - 1.001*lambda^3*x*u = 0";
  expect(proveConsistency(problem).holds).toBe(false);
});

it("a built-in solution is typeset by its name", () => {
  expect(typesetProblem(shippedProblem("airy-oscillatory")).exact).toEqual([
    "u(x) = \\operatorname{Ai}(\\lambda\\,x)",
  ]);
  expect(() => builtIn("none")).toThrow(/airy/);
});
