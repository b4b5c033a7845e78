/** Local polynomial reconstruction from the nodes nearest a place. */

import { fornbergWeights } from "./fornberg-weights";

/** Weights of consecutive values from `first` on; indices wrap on a periodic axis. */
export interface LocalStencil {
  first: number;
  weights: Float64Array;
}

/** What a piecewise reconstruction is made from. */
export interface PiecewiseSource {
  /** Nodes, ascending. */
  nodes: Float64Array;
  /** Edges of the cells about the nodes; null where the data are point values. */
  edges: Float64Array | null;
  /** Length of the period; null on a bounded axis. */
  period: number | null;
  degree: number;
}

/** Index of the last entry at or below a place, or -1. */
function lastAtOrBelow(sorted: Float64Array, at: number): number {
  let low = -1;
  let high = sorted.length;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (sorted[middle] <= at) low = middle;
    else high = middle;
  }
  return low;
}

/** An entry of a grid by an index that may lie outside it on a periodic axis. */
function entryAt(sorted: Float64Array, index: number, count: number, period: number | null): number {
  if (period === null) return sorted[index];
  const wrapped = ((index % count) + count) % count;
  return sorted[wrapped] + ((index - wrapped) / count) * period;
}

/** First index of a stencil of `count` nodes centred about a place. */
function centredStart({ nodes, period }: PiecewiseSource, at: number, count: number): number {
  const n = nodes.length;
  const left = lastAtOrBelow(nodes, at);
  let first: number;
  if (count % 2 === 0) {
    first = left - count / 2 + 1;
  } else {
    const gapLeft = at - entryAt(nodes, period === null ? Math.max(left, 0) : left, n, period);
    const gapRight = entryAt(nodes, period === null ? Math.min(left + 1, n - 1) : left + 1, n, period) - at;
    first = (gapLeft <= gapRight ? left : left + 1) - (count - 1) / 2;
  }
  return period === null ? Math.max(0, Math.min(first, n - count)) : first;
}

/**
 * The stencil that reconstructs the value at a place: degree + 1 values, centred, one-sided at the ends of a bounded
 * axis.
 *
 * Cell averages are reconstructed through their primitive, which is known at the cells' edges, so that each cell of
 * the stencil keeps its average.
 *
 * @param source nodes, edges, period, degree (1 to 7)
 * @param at place of evaluation
 * @returns the stencil; on a periodic axis `first` may be negative or reach beyond the last node
 * @example piecewiseStencil({ nodes, edges: null, period: null, degree: 3 }, 0.4)
 * @see Fornberg 1988 (weights); Harten, Engquist, Osher and Chakravarthy 1987 (reconstruction via primitive function)
 */
export function piecewiseStencil(source: PiecewiseSource, at: number): LocalStencil {
  const { nodes, edges, period } = source;
  const n = nodes.length;
  const count = Math.min(source.degree + 1, n);
  if (!edges) {
    const first = centredStart(source, at, count);
    const local = Float64Array.from({ length: count }, (_, k) => entryAt(nodes, first + k, n, period));
    return { first, weights: fornbergWeights(0, at, local) };
  }
  const cell = lastAtOrBelow(edges, at);
  const wanted = cell - Math.floor((count - 1) / 2);
  const first = period === null ? Math.max(0, Math.min(wanted, n - count)) : wanted;
  const local = Float64Array.from({ length: count + 1 }, (_, k) => entryAt(edges, first + k, n, period));
  const onEdges = fornbergWeights(1, at, local);
  const weights = new Float64Array(count);
  let above = 0;
  for (let j = count - 1; j >= 0; j--) {
    above += onEdges[j + 1];
    weights[j] = above * (local[j + 1] - local[j]);
  }
  return { first, weights };
}
