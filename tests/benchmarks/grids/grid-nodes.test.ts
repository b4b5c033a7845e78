import { describe, expect, it } from "vitest";
import { intervalsOf, nodesOf, nodesOfIntervals } from "@/benchmarks/grids/grid-nodes";

const kinds = [
  "uniform-periodic",
  "uniform",
  "cell-centred",
  "chebyshev-lobatto",
  "chebyshev-gauss",
  "legendre-lobatto",
  "legendre-gauss",
] as const;

describe("the nodes of a grid", () => {
  it("ascend strictly and stay within the interval", () => {
    for (const kind of kinds) {
      for (const n of [4, 5, 16, 33, 200]) {
        const nodes = nodesOf(kind, n, -2, 3);
        expect(nodes).toHaveLength(n);
        expect(nodes[0]).toBeGreaterThanOrEqual(-2);
        expect(nodes[n - 1]).toBeLessThanOrEqual(3);
        for (let j = 1; j < n; j++) expect(nodes[j]).toBeGreaterThan(nodes[j - 1]);
      }
    }
  });

  it("hold both ends exactly where the ends are nodes, and neither on cell-centred and Gauss grids", () => {
    const [a, b] = [0.1, 0.7];
    for (const kind of ["uniform", "chebyshev-lobatto", "legendre-lobatto"] as const) {
      const nodes = nodesOf(kind, 12, a, b);
      expect([nodes[0], nodes[11]]).toEqual([a, b]);
      expect(intervalsOf(kind, 12)).toBe(11);
      expect(nodesOfIntervals(kind, 11)).toBe(12);
    }
    for (const kind of ["cell-centred", "chebyshev-gauss", "legendre-gauss"] as const) {
      const nodes = nodesOf(kind, 12, a, b);
      expect(nodes[0]).toBeGreaterThan(a);
      expect(nodes[11]).toBeLessThan(b);
      expect(intervalsOf(kind, 12)).toBe(12);
    }
  });

  it("mirror each other about the middle on bounded grids", () => {
    for (const kind of kinds.slice(2)) {
      const nodes = nodesOf(kind, 31, -1, 1);
      nodes.forEach((x, j) => expect(Math.abs(x + nodes[30 - j])).toBeLessThanOrEqual(2 ** -52));
    }
  });

  it("scale and shift with the interval", () => {
    for (const kind of kinds) {
      const unit = nodesOf(kind, 17, 0, 1);
      const wide = nodesOf(kind, 17, 10, 14);
      unit.forEach((x, j) => expect(Math.abs(10 + 4 * x - wide[j])).toBeLessThanOrEqual(16 * 2 ** -52));
    }
  });

  it("are refused where the number or the interval is not one", () => {
    expect(() => nodesOf("uniform", 1, 0, 1)).toThrow(/from 2 on, not 1/);
    expect(() => nodesOf("uniform", 2.5, 0, 1)).toThrow(RangeError);
    expect(() => nodesOf("uniform", 8, 1, 1)).toThrow(/a < b/);
    expect(() => nodesOf("listed", 8, 0, 1)).toThrow(RangeError);
  });
});

describe("intervals of a listed grid", () => {
  it("are its gaps on a bounded axis and its nodes on a periodic one", () => {
    expect(intervalsOf("listed", 20, false)).toBe(19);
    expect(intervalsOf("listed", 20, true)).toBe(20);
  });
});
