/** Cells about the nodes of a grid: their edges and widths. */

/**
 * Edges of the cells that reach from midpoint to midpoint between nodes.
 *
 * On bounded axes the outer cells reach a and b; on periodic ones the first edge is the midpoint across the seam, and
 * the last is one period on.
 *
 * @param nodes ascending, in the unit of the axis
 * @param a left end
 * @param b right end
 * @returns one more edge than there are nodes, ascending
 * @throws RangeError where there are fewer than two nodes
 * @example cellEdges(Float64Array.of(0, 0.5, 1), 0, 1, false) // [0, 0.25, 0.75, 1]
 * @see LeVeque 2002, section 4.1 (grid cells and their interfaces)
 */
export function cellEdges(nodes: Float64Array, a: number, b: number, isPeriodic: boolean): Float64Array {
  const n = nodes.length;
  if (n < 2) throw new RangeError(`Cells need two nodes or more, not ${n}`);
  const edges = new Float64Array(n + 1);
  for (let j = 1; j < n; j++) edges[j] = (nodes[j - 1] + nodes[j]) / 2;
  edges[0] = isPeriodic ? (nodes[0] + nodes[n - 1] - (b - a)) / 2 : a;
  edges[n] = isPeriodic ? edges[0] + (b - a) : b;
  return edges;
}

/**
 * Widths of the cells about the nodes; they sum to b - a.
 *
 * @returns one width for each node, in the unit of the axis
 * @throws RangeError where there are fewer than two nodes
 * @example cellWidths(Float64Array.of(0, 0.5, 1), 0, 1, false) // [0.25, 0.5, 0.25]
 * @see LeVeque 2002, section 4.1
 */
export function cellWidths(nodes: Float64Array, a: number, b: number, isPeriodic: boolean): Float64Array {
  const edges = cellEdges(nodes, a, b, isPeriodic);
  return Float64Array.from(nodes, (_, j) => edges[j + 1] - edges[j]);
}
