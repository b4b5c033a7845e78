/** Quadrature weights of every kind of grid along one axis. */

import type { GridKind } from "../grids/grid-kind";
import { gaussLegendre, gaussLobatto } from "../grids/legendre-rule";
import { cellWidths } from "./cell-widths";
import { clenshawCurtisWeights, fejerWeights } from "./clenshaw-curtis";

/**
 * The weights that integrate over [a, b] on the nodes of a grid; they sum to L = b - a.
 *
 * L/N each on periodic and cell-centred grids, the composite trapezoid rule on uniform ones, Clenshaw-Curtis and
 * Fejer's first rule on the Chebyshev grids, Gauss and Gauss-Lobatto rules on the Legendre ones, and the widths of
 * midpoint-to-midpoint cells on a listed grid.
 *
 * @param kind kind of grid
 * @param nodes its nodes, ascending, in the unit of the axis
 * @param a left end
 * @param b right end
 * @param isPeriodic only decides for `listed` grids
 * @returns one weight for each node, in the unit of the axis
 * @throws RangeError where there are fewer than two nodes
 * @example weightsOf("uniform", nodesOf("uniform", 3, 0, 1), 0, 1) // [0.25, 0.5, 0.25]
 * @see Clenshaw and Curtis 1960; Fejer 1933; Waldvogel 2006; Abramowitz and Stegun 1964, section 25.4
 */
export function weightsOf(
  kind: GridKind,
  nodes: Float64Array,
  a: number,
  b: number,
  isPeriodic: boolean = false,
): Float64Array {
  const n = nodes.length;
  if (n < 2) throw new RangeError(`A quadrature rule needs two nodes or more, not ${n}`);
  const half = (b - a) / 2;
  switch (kind) {
    case "uniform-periodic":
    case "cell-centred":
      return new Float64Array(n).fill((b - a) / n);
    case "uniform": {
      const weights = new Float64Array(n).fill((b - a) / (n - 1));
      weights[0] /= 2;
      weights[n - 1] /= 2;
      return weights;
    }
    case "chebyshev-lobatto":
      return clenshawCurtisWeights(n).map((weight) => half * weight);
    case "chebyshev-gauss":
      return fejerWeights(n).map((weight) => half * weight);
    case "legendre-lobatto":
      return gaussLobatto(n).weights.map((weight) => half * weight);
    case "legendre-gauss":
      return gaussLegendre(n).weights.map((weight) => half * weight);
    case "listed":
      return cellWidths(nodes, a, b, isPeriodic);
  }
}
