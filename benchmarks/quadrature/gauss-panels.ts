/** Composite Gauss rules: the same few points in every panel of an interval. */

import { gaussLegendre } from "../grids/legendre-rule";

/** Points with their weights, both in the unit of the axis. */
export interface QuadraturePoints {
  points: Float64Array;
  weights: Float64Array;
}

/**
 * Gauss-Legendre points in each panel between neighbouring edges.
 *
 * @param edges ascending, one more than there are panels
 * @param order points in each panel
 * @returns (edges - 1) * order points, ascending, with weights that sum to the whole length
 * @throws RangeError where there are fewer than two edges
 * @example gaussPanels(Float64Array.of(0, 0.5, 1), 8).points.length // 16
 * @see Davis and Rabinowitz 1984, section 2.7 (compound Gauss rules)
 */
export function gaussPanels(edges: Float64Array, order: number): QuadraturePoints {
  const panels = edges.length - 1;
  if (panels < 1) throw new RangeError(`Panels need two edges or more, not ${edges.length}`);
  const rule = gaussLegendre(order);
  const points = new Float64Array(panels * order);
  const weights = new Float64Array(panels * order);
  for (let p = 0; p < panels; p++) {
    const middle = (edges[p] + edges[p + 1]) / 2;
    const half = (edges[p + 1] - edges[p]) / 2;
    for (let k = 0; k < order; k++) {
      points[p * order + k] = middle + half * rule.nodes[k];
      weights[p * order + k] = half * rule.weights[k];
    }
  }
  return { points, weights };
}
