import { describe, expect, it } from "vitest";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import { normsOf, sumErrors } from "@/benchmarks/norms/error-norms";
import { weightsOf } from "@/benchmarks/quadrature/quadrature-weights";
import type { GridKind } from "@/benchmarks/grids/grid-kind";

// Source: definitions of LeVeque 2007, appendix A, and Oberkampf and Roy 2010, chapter 5 (from memory); the values are
// derived from them in closed form.

const eps = 2 ** -52;

function normsOfError(kind: GridKind, n: number, a: number, b: number, error: (x: number) => number) {
  const nodes = nodesOf(kind, n, a, b);
  const weights = weightsOf(kind, nodes, a, b);
  const values = nodes.map(error);
  const zero = new Float64Array(n);
  return normsOf([sumErrors({ values, imaginary: null }, { values: zero, imaginary: null }, [weights])]);
}

describe("norms of sin x on a periodic grid", () => {
  it("has an L2 norm of the root of pi whatever the number of nodes", () => {
    for (const n of [3, 4, 7, 12, 64, 1000]) {
      const { l2 } = normsOfError("uniform-periodic", n, 0, 2 * Math.PI, Math.sin);
      expect(Math.abs(l2 - 1.772453850905516)).toBeLessThanOrEqual(8 * eps);
    }
  });

  it("has an L1 norm of (4 pi/N) cot(pi/N) and a maximum of 1 where 4 divides N", () => {
    for (const n of [4, 8, 12, 64, 1024]) {
      const { l1, max } = normsOfError("uniform-periodic", n, 0, 2 * Math.PI, Math.sin);
      const expected = (4 * Math.PI) / n / Math.tan(Math.PI / n);
      expect(Math.abs(l1 - expected)).toBeLessThanOrEqual(32 * eps);
      expect(max).toBe(1);
    }
  });
});

describe("norms on [-1, 1]", () => {
  it("of 1 with Clenshaw-Curtis weights are 2 and the root of 2", () => {
    for (const n of [3, 8, 33, 500]) {
      const { l1, l2 } = normsOfError("chebyshev-lobatto", n, -1, 1, () => 1);
      expect(Math.abs(l1 - 2)).toBeLessThanOrEqual(8 * eps);
      expect(Math.abs(l2 - Math.SQRT2)).toBeLessThanOrEqual(8 * eps);
    }
  });

  it("of x with Clenshaw-Curtis weights have the exact square 2/3", () => {
    for (const n of [3, 4, 9, 64]) {
      expect(
        Math.abs(normsOfError("chebyshev-lobatto", n, -1, 1, (x) => x).l2 ** 2 - 2 / 3),
      ).toBeLessThanOrEqual(8 * eps);
    }
  });

  it("of x with n trapezoids have the square 2/3 + h^2/3", () => {
    for (const n of [2, 5, 10]) {
      const h = 2 / n;
      const { l2 } = normsOfError("uniform", n + 1, -1, 1, (x) => x);
      expect(Math.abs(l2 ** 2 - (2 / 3 + h ** 2 / 3))).toBeLessThanOrEqual(8 * eps);
    }
  });
});

describe("the inequalities between norms", () => {
  it("hold: L1/|O| <= L2/|O|^(1/2) <= max, and L2^2 <= L1 max", () => {
    for (const kind of ["uniform", "chebyshev-gauss", "legendre-lobatto", "cell-centred"] as const) {
      const { l1, l2, max } = normsOfError(kind, 40, 0, 3, (x) => Math.exp(-x) * Math.cos(7 * x));
      expect(l1 / 3).toBeLessThanOrEqual(l2 / Math.sqrt(3));
      expect(l2 / Math.sqrt(3)).toBeLessThanOrEqual(max);
      expect(l2 ** 2).toBeLessThanOrEqual(l1 * max);
    }
  });
});
