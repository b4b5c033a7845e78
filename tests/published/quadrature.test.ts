import { describe, expect, it } from "vitest";
import { gaussLegendre } from "@/benchmarks/grids/legendre-rule";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { clenshawCurtisWeights } from "@/benchmarks/quadrature/clenshaw-curtis";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";

const eps = 2 ** -52;
const root2 = Math.SQRT2;
const root5 = Math.sqrt(5);

describe("Clenshaw-Curtis weights", () => {
  // Source: Clenshaw and Curtis 1960; Trefethen 2000, chapter 12; Waldvogel 2006 (from memory, verified there
  // against a moment solve in 50 digits). Keys are numbers of intervals.
  const published: Record<number, number[]> = {
    1: [1, 1],
    2: [1 / 3, 4 / 3, 1 / 3],
    3: [1 / 9, 8 / 9, 8 / 9, 1 / 9],
    4: [1 / 15, 8 / 15, 4 / 5, 8 / 15, 1 / 15],
    5: [
      0.04, 0.36074304120001121619, 0.59925695879998878381, 0.59925695879998878381, 0.36074304120001121619,
      0.04,
    ],
    6: [1 / 35, 16 / 63, 16 / 35, 164 / 315, 16 / 35, 16 / 63, 1 / 35],
    8: [
      1 / 63,
      16 / 63 - (8 * root2) / 105,
      88 / 315,
      (8 * root2) / 105 + 16 / 63,
      124 / 315,
      (8 * root2) / 105 + 16 / 63,
      88 / 315,
      16 / 63 - (8 * root2) / 105,
      1 / 63,
    ],
  };

  it("are the published fractions for 1 to 6 and 8 intervals", () => {
    for (const [intervals, weights] of Object.entries(published)) {
      const got = clenshawCurtisWeights(Number(intervals) + 1);
      weights.forEach((weight, k) => expect(Math.abs(got[k] - weight)).toBeLessThanOrEqual(4 * eps));
    }
    expect(published[5][1]).toBeCloseTo(12 / 25 - (4 * root5) / 75, 15);
  });

  it("have end weights 1/(N^2 - 1) for even N and 1/N^2 for odd N", () => {
    expect(clenshawCurtisWeights(1001)[0]).toBe(1 / (1000 ** 2 - 1));
    expect(clenshawCurtisWeights(1000)[0]).toBe(1 / 999 ** 2);
  });
});

describe("Gauss-Legendre nodes and weights", () => {
  // Source: Abramowitz and Stegun 1964, table 25.4; DLMF section 3.5(v). 15 digits from memory, n = 5 and 10 as quoted
  // by public test files; all verified as roots of P_n at 45 digits. [node, weight] for nodes from 0 on.
  const published: Record<number, [number, number][]> = {
    2: [[0.577350269189625764509, 1]],
    3: [
      [0, 0.888888888888888888889],
      [0.774596669241483377036, 0.555555555555555555556],
    ],
    4: [
      [0.339981043584856264803, 0.652145154862546142627],
      [0.861136311594052575224, 0.347854845137453857373],
    ],
    5: [
      [0, 0.568888888888888888889],
      [0.538469310105683091036, 0.478628670499366468041],
      [0.906179845938663992798, 0.236926885056189087514],
    ],
    6: [
      [0.238619186083196908631, 0.46791393457269104739],
      [0.661209386466264513661, 0.360761573048138607569],
      [0.932469514203152027812, 0.17132449237917034504],
    ],
    8: [
      [0.183434642495649804939, 0.362683783378361982965],
      [0.525532409916328985818, 0.313706645877887287338],
      [0.796666477413626739592, 0.222381034453374470544],
      [0.960289856497536231684, 0.101228536290376259153],
    ],
    10: [
      [0.148874338981631210885, 0.295524224714752870174],
      [0.433395394129247190799, 0.269266719309996355091],
      [0.679409568299024406234, 0.219086362515982043996],
      [0.865063366688984510732, 0.149451349150580593146],
      [0.973906528517171720078, 0.066671344308688137594],
    ],
  };

  it("are the tabulated ones for n = 2 to 10, to 2 ulp", () => {
    for (const [n, pairs] of Object.entries(published)) {
      const { nodes, weights } = gaussLegendre(Number(n));
      const first = nodes.length - pairs.length;
      pairs.forEach(([node, weight], k) => {
        expect(Math.abs(nodes[first + k] - node)).toBeLessThanOrEqual(eps);
        expect(Math.abs(weights[first + k] - weight)).toBeLessThanOrEqual(2 * eps * weight);
      });
    }
  });
});

describe("the periodic trapezoid rule", () => {
  // Source: Trefethen and Weideman, SIAM Review 56 (2014), from memory: the mean of exp(cos x) is I_0(1), and the error
  // of N points is 2 (I_N(1) + I_2N(1) + ...).
  const besselI0 = 1.26606587775200833559824462521;
  const published: [number, number][] = [
    [2, 0.277014757063],
    [4, 0.00547443965561],
    [6, 4.49773239934e-5],
    [8, 1.99212480669e-7],
    [10, 5.50589607967e-10],
    [12, 1.03915223068e-12],
  ];

  it("has the published errors for the mean of exp(cos x)", () => {
    for (const [n, error] of published) {
      const nodes = nodesOf("uniform-periodic", n, 0, 2 * Math.PI);
      const weights = weightsOf("uniform-periodic", nodes, 0, 2 * Math.PI);
      const integral = nodes.reduce((sum, x, j) => sum + weights[j] * Math.exp(Math.cos(x)), 0);
      expect(Math.abs(integral / (2 * Math.PI) - besselI0 - error)).toBeLessThanOrEqual(
        1e-11 * error + 8 * eps,
      );
    }
  });
});
