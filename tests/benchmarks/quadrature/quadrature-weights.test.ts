import { describe, expect, it } from "vitest";
import type { GridKind } from "@/benchmarks/grids/grid-kind";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { gaussLegendre, gaussLobatto } from "@/benchmarks/grids/legendre-rule";
import { cellEdges } from "@/benchmarks/quadrature/cell-widths";
import { gaussPanels } from "@/benchmarks/quadrature/gauss-panels";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";

const eps = 2 ** -52;

function integrate(kind: GridKind, n: number, a: number, b: number, f: (x: number) => number): number {
  const nodes = nodesOf(kind, n, a, b);
  const weights = weightsOf(kind, nodes, a, b);
  return nodes.reduce((sum, x, j) => sum + weights[j] * f(x), 0);
}

const kinds = [
  "uniform-periodic",
  "uniform",
  "cell-centred",
  "chebyshev-lobatto",
  "chebyshev-gauss",
  "legendre-lobatto",
  "legendre-gauss",
] as const;

describe("quadrature weights", () => {
  it("sum to the length of the interval, are positive and mirror each other", () => {
    for (const kind of kinds) {
      for (const n of [4, 7, 64, 129, 1000]) {
        const weights = weightsOf(kind, nodesOf(kind, n, -1, 4), -1, 4);
        expect(Math.abs(weights.reduce((sum, w) => sum + w, 0) - 5)).toBeLessThanOrEqual(
          8 * Math.sqrt(n) * eps * 5,
        );
        weights.forEach((weight, j) => {
          expect(weight).toBeGreaterThan(0);
          expect(Math.abs(weight - weights[n - 1 - j])).toBeLessThanOrEqual(4 * eps * weight);
        });
      }
    }
  });

  it("integrate Chebyshev polynomials exactly up to the degree of each rule, and not beyond", () => {
    const degrees: [GridKind, (n: number) => number][] = [
      ["chebyshev-lobatto", (n) => n - 1],
      ["chebyshev-gauss", (n) => n - 1],
      ["legendre-lobatto", (n) => 2 * n - 3],
      ["legendre-gauss", (n) => 2 * n - 1],
    ];
    for (const [kind, highest] of degrees) {
      for (const n of [5, 8, 21]) {
        for (let degree = 0; degree <= highest(n); degree += 1) {
          const exact = degree % 2 === 0 ? 2 / (1 - degree ** 2) : 0;
          const got = integrate(kind, n, -1, 1, (x) =>
            Math.cos(degree * Math.acos(Math.max(-1, Math.min(1, x)))),
          );
          expect(Math.abs(got - exact)).toBeLessThanOrEqual(64 * n * eps);
        }
        const beyond = highest(n) + (highest(n) % 2 === 0 ? 2 : 1);
        const got = integrate(kind, n, -1, 1, (x) => Math.cos(beyond * Math.acos(x)));
        expect(Math.abs(got - 2 / (1 - beyond ** 2))).toBeGreaterThan(1e-6);
      }
    }
  });

  it("converge at second order on uniform and cell-centred grids, with opposite signs", () => {
    const errorOf = (kind: GridKind, n: number) => integrate(kind, n, 0, 1, Math.exp) - (Math.E - 1);
    expect(errorOf("uniform", 33) / errorOf("uniform", 65)).toBeCloseTo(4, 2);
    expect(errorOf("cell-centred", 32) / errorOf("cell-centred", 64)).toBeCloseTo(4, 2);
    expect(errorOf("uniform", 33) / errorOf("cell-centred", 32)).toBeCloseTo(-2, 2);
  });

  it("of Chebyshev grids integrate exp to rounding at any length, prime or not", () => {
    for (const kind of ["chebyshev-lobatto", "chebyshev-gauss"] as const) {
      for (const n of [17, 18, 97, 513, 4096]) {
        expect(Math.abs(integrate(kind, n, -1, 1, Math.exp) - (Math.E - 1 / Math.E))).toBeLessThanOrEqual(
          64 * eps,
        );
      }
    }
  });
});

describe("Legendre rules of 4096 nodes", () => {
  // Reference: Newton iteration in 160-bit fixed-point arithmetic, carried out for these tests.
  const gauss = [
    [0, -0.9999998276897039, 4.4220385139094866e-7],
    [1, -0.999999092107425, 1.029366140415133e-6],
    [13, -0.9999443963418325, 8.086647111063924e-6],
    [760, -0.8345853181934879, 0.0004224670932287323],
    [2018, -0.02262152499116408, 0.0007667005244442999],
  ] as const;
  const lobatto = [
    [1, -0.9999995623363581, 7.350632612709826e-7],
    [13, -0.9999483707376103, 7.79640279241361e-6],
    [760, -0.8347181295563502, 0.000422415903102653],
    [2018, -0.02262704823036523, 0.0007668876570324421],
  ] as const;

  it("are accurate to 2 ulp in nodes and weights", () => {
    const { nodes, weights } = gaussLegendre(4096);
    for (const [index, node, weight] of gauss) {
      expect(Math.abs(nodes[index] - node)).toBeLessThanOrEqual(2 * eps * Math.abs(node));
      expect(Math.abs(weights[index] / weight - 1)).toBeLessThanOrEqual(2 * eps);
    }
    const closed = gaussLobatto(4096);
    for (const [index, node, weight] of lobatto) {
      expect(Math.abs(closed.nodes[index] - node)).toBeLessThanOrEqual(2 * eps * Math.abs(node));
      expect(Math.abs(closed.weights[index] / weight - 1)).toBeLessThanOrEqual(2 * eps);
    }
  });
});

describe("cells of a listed grid", () => {
  it("reach the ends of a bounded axis, and wrap around a periodic one", () => {
    const nodes = Float64Array.of(0.1, 0.2, 0.6, 0.9);
    expect([...weightsOf("listed", nodes, 0, 1, false)].map((w) => Number(w.toFixed(12)))).toEqual([
      0.15, 0.25, 0.35, 0.25,
    ]);
    expect([...weightsOf("listed", nodes, 0, 1, true)].map((w) => Number(w.toFixed(12)))).toEqual([
      0.15, 0.25, 0.35, 0.25,
    ]);
    expect([...cellEdges(Float64Array.of(0, 0.5), 0, 1, true)]).toEqual([-0.25, 0.25, 0.75]);
  });
});

describe("Gauss panels", () => {
  it("integrate polynomials of degree 2m - 1 exactly in every panel", () => {
    const { points, weights } = gaussPanels(Float64Array.of(0, 0.3, 2), 8);
    const integral = points.reduce((sum, x, i) => sum + weights[i] * x ** 15, 0);
    expect(Math.abs(integral / (2 ** 16 / 16) - 1)).toBeLessThanOrEqual(16 * eps);
  });
});
