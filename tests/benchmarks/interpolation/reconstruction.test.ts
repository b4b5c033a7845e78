import { describe, expect, it } from "vitest";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import {
  barycentricWeights,
  polynomialSlopeWeights,
  polynomialValueWeights,
} from "@/benchmarks/interpolation/barycentric";
import { reconstructLines, type LineAxis } from "@/benchmarks/interpolation/reconstruct-lines";
import { cellEdges } from "@/benchmarks/quadrature/cell-widths";
import type { GridKind } from "@/benchmarks/grids/grid-kind";

function axisOf(
  kind: GridKind,
  n: number,
  a: number,
  b: number,
  isPeriodic: boolean,
  isAverage = false,
): LineAxis {
  const nodes = nodesOf(kind, n, a, b);
  return { kind, nodes, a, b, isPeriodic, edges: isAverage ? cellEdges(nodes, a, b, isPeriodic) : null };
}

const offsets = (m: number, a: number, b: number) =>
  Float64Array.from({ length: m }, (_, i) => a + ((i + 0.5) * (b - a)) / m);

const largest = (got: Float64Array, expected: (i: number) => number) =>
  got.reduce((most, value, i) => Math.max(most, Math.abs(value - expected(i))), 0);

describe("the global polynomial", () => {
  it("through Chebyshev nodes has the published errors for the Runge function", () => {
    // Source: Runge 1901; Trefethen, Approximation Theory and Approximation Practice (from memory); errors recomputed in
    // 30-digit arithmetic with the maximum refined. Here the maximum is over 20,001 equispaced places.
    const published: [GridKind, number, number][] = [
      ["chebyshev-lobatto", 10, 0.1321974272],
      ["chebyshev-lobatto", 20, 0.01773782481],
      ["chebyshev-gauss", 10, 0.109153511],
      ["chebyshev-gauss", 20, 0.01533373519],
      ["uniform", 10, 1.915658918],
    ];
    const runge = (x: number) => 1 / (1 + 25 * x * x);
    const places = Float64Array.from({ length: 20001 }, (_, i) => -1 + i / 10000);
    for (const [kind, degree, error] of published) {
      const axis = axisOf(kind, degree + 1, -1, 1, false);
      const got = reconstructLines(axis.nodes.map(runge), axis, { kind: "polynomial" }, places);
      expect(Math.abs(largest(got, (i) => runge(places[i])) / error - 1)).toBeLessThanOrEqual(1e-5);
    }
  });

  it("is exact for polynomials on every grid, in value and slope, at nodes and between them", () => {
    for (const kind of [
      "uniform",
      "cell-centred",
      "legendre-lobatto",
      "legendre-gauss",
      "chebyshev-gauss",
    ] as const) {
      const nodes = nodesOf(kind, 9, 1, 3);
      const weights = barycentricWeights(kind, nodes);
      for (const at of [1, 1.37, nodes[4], 3]) {
        const values = polynomialValueWeights(nodes, weights, at);
        const slopes = polynomialSlopeWeights(nodes, weights, at);
        const value = nodes.reduce((sum, x, j) => sum + values[j] * (x - 2) ** 8, 0);
        const slope = nodes.reduce((sum, x, j) => sum + slopes[j] * (x - 2) ** 8, 0);
        expect(Math.abs(value - (at - 2) ** 8)).toBeLessThanOrEqual(1e-13);
        expect(Math.abs(slope - 8 * (at - 2) ** 7)).toBeLessThanOrEqual(1e-11);
      }
    }
  });

  it("stays finite through thousands of nodes", () => {
    const axis = axisOf("legendre-gauss", 2000, -1, 1, false);
    const places = offsets(64, -1, 1);
    const got = reconstructLines(axis.nodes.map(Math.exp), axis, { kind: "polynomial" }, places);
    expect(largest(got, (i) => Math.exp(places[i]))).toBeLessThanOrEqual(1e-12);
  });
});

describe("the trigonometric interpolant", () => {
  const wave = (x: number) => Math.exp(Math.sin(x));

  it("reproduces resolved data at any N, on nodes with and without the half-cell offset", () => {
    const places = offsets(100, 0, 2 * Math.PI);
    for (const kind of ["uniform-periodic", "cell-centred"] as const) {
      for (const n of [40, 41, 256]) {
        const axis = axisOf(kind, n, 0, 2 * Math.PI, true);
        const got = reconstructLines(axis.nodes.map(wave), axis, { kind: "trigonometric" }, places);
        expect(largest(got, (i) => wave(places[i]))).toBeLessThanOrEqual(1e-13);
      }
    }
  });

  it("turns cell averages back into point values", () => {
    const axis = axisOf("cell-centred", 64, 0, 2 * Math.PI, true, true);
    const h = (2 * Math.PI) / 64;
    const averages = axis.nodes.map(
      (x) => 1 + (Math.cos(3 * (x - h / 2)) - Math.cos(3 * (x + h / 2))) / (3 * h),
    );
    const places = offsets(50, 0, 2 * Math.PI);
    const got = reconstructLines(averages, axis, { kind: "trigonometric" }, places);
    expect(largest(got, (i) => 1 + Math.sin(3 * places[i]))).toBeLessThanOrEqual(1e-13);
  });

  it("splits the highest mode of an even N, so that it is a cosine", () => {
    const axis = axisOf("uniform-periodic", 4, 0, 1, true);
    const places = offsets(8, 0, 1);
    const got = reconstructLines(Float64Array.of(1, -1, 1, -1), axis, { kind: "trigonometric" }, places);
    expect(largest(got, (i) => Math.cos(4 * Math.PI * places[i]))).toBeLessThanOrEqual(1e-14);
  });
});

describe("piecewise polynomials", () => {
  it("of degree p are exact for polynomials of degree p, up to the ends of a bounded axis", () => {
    const places = offsets(77, 0, 1);
    for (let degree = 1; degree <= 7; degree++) {
      for (const kind of ["uniform", "cell-centred", "chebyshev-lobatto"] as const) {
        const axis = axisOf(kind, 12, 0, 1, false);
        const f = (x: number) => (x - 0.3) ** degree;
        const got = reconstructLines(
          axis.nodes.map(f),
          axis,
          { kind: "piecewise-polynomial", degree },
          places,
        );
        expect(largest(got, (i) => f(places[i]))).toBeLessThanOrEqual(1e-13);
      }
    }
  });

  it("made from cell averages keep degree p too", () => {
    const places = offsets(40, 0, 1);
    for (let degree = 1; degree <= 7; degree++) {
      const axis = axisOf("cell-centred", 10, 0, 1, false, true);
      const primitive = (x: number) => (x - 0.3) ** (degree + 1) / (degree + 1);
      const averages = axis.nodes.map((x) => (primitive(x + 0.05) - primitive(x - 0.05)) / 0.1);
      const got = reconstructLines(averages, axis, { kind: "piecewise-polynomial", degree }, places);
      expect(largest(got, (i) => (places[i] - 0.3) ** degree)).toBeLessThanOrEqual(1e-12);
    }
  });

  it("wrap around a periodic axis and converge at order p + 1", () => {
    const places = offsets(501, 0, 2 * Math.PI);
    const errorOf = (n: number) => {
      const axis = axisOf("uniform-periodic", n, 0, 2 * Math.PI, true);
      const values = axis.nodes.map(Math.sin);
      const got = reconstructLines(values, axis, { kind: "piecewise-polynomial", degree: 3 }, places);
      return largest(got, (i) => Math.sin(places[i]));
    };
    expect(Math.log2(errorOf(40) / errorOf(80))).toBeCloseTo(4, 1);
  });
});
