/** Reconstruction of gridded values at places between the nodes, line by line along one axis. */

import type { GridKind } from "../grids/grid-kind";
import { barycentricWeights, polynomialValueWeights } from "./barycentric";
import { piecewiseStencil } from "./piecewise-polynomial";
import { trigonometricValues } from "./trigonometric";

/** How values along one axis are reconstructed. */
export type AxisReconstruction =
  { kind: "trigonometric" } | { kind: "polynomial" } | { kind: "piecewise-polynomial"; degree: number };

/** One axis of the data. */
export interface LineAxis {
  kind: GridKind;
  nodes: Float64Array;
  a: number;
  b: number;
  isPeriodic: boolean;
  /** Edges of the cells that the data are averages over; null for point values. */
  edges: Float64Array | null;
}

/**
 * Values at `points` on each of several lines of data.
 *
 * @param lines row-major, one line after the other, each as long as the axis has nodes
 * @param axis nodes and interval
 * @param reconstruction trigonometric needs equally spaced periodic data and takes (m + 1/2)/M of the period as points
 * @param points places of evaluation, ascending
 * @returns row-major, one line of `points.length` values for each line of data
 * @throws RangeError where the lines do not fit the axis
 * @example reconstructLines(u, axis, { kind: "polynomial" }, points)
 * @see Trefethen 2000 (trigonometric); Berrut and Trefethen 2004 (polynomial); Fornberg 1988 (piecewise)
 */
export function reconstructLines(
  lines: Float64Array,
  axis: LineAxis,
  reconstruction: AxisReconstruction,
  points: Float64Array,
): Float64Array {
  const n = axis.nodes.length;
  const m = points.length;
  const count = lines.length / n;
  if (!Number.isInteger(count))
    throw new RangeError(`Lines of ${n} nodes do not make ${lines.length} values`);
  const out = new Float64Array(count * m);
  if (reconstruction.kind === "trigonometric") {
    const samples = { offset: axis.kind === "cell-centred" ? 0.5 : 0, isAverage: axis.edges !== null };
    for (let i = 0; i < count; i++) {
      trigonometricValues(lines.subarray(i * n, (i + 1) * n), samples, out.subarray(i * m, (i + 1) * m));
    }
    return out;
  }
  const stencilAt = stencilsOf(axis, reconstruction);
  for (let p = 0; p < m; p++) {
    const { first, weights } = stencilAt(points[p]);
    for (let i = 0; i < count; i++) {
      let sum = 0;
      if (first >= 0 && first + weights.length <= n) {
        const start = i * n + first;
        for (let k = 0; k < weights.length; k++) sum += weights[k] * lines[start + k];
      } else {
        for (let k = 0; k < weights.length; k++) {
          sum += weights[k] * lines[i * n + ((((first + k) % n) + n) % n)];
        }
      }
      out[i * m + p] = sum;
    }
  }
  return out;
}

function stencilsOf(axis: LineAxis, reconstruction: Exclude<AxisReconstruction, { kind: "trigonometric" }>) {
  if (reconstruction.kind === "piecewise-polynomial") {
    const period = axis.isPeriodic ? axis.b - axis.a : null;
    const source = { nodes: axis.nodes, edges: axis.edges, period, degree: reconstruction.degree };
    return (at: number) => piecewiseStencil(source, at);
  }
  const barycentric = barycentricWeights(axis.kind, axis.nodes);
  const weights = new Float64Array(axis.nodes.length);
  return (at: number) => ({
    first: 0,
    weights: polynomialValueWeights(axis.nodes, barycentric, at, weights),
  });
}
