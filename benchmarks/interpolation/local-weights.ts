/** Weights of interpolation and differentiation at one place from a few nodes. */

/**
 * Weights w such that the sum of w_j f(x_j) is the m-th derivative, at one place, of the polynomial through the nodes.
 *
 * @param at place of evaluation
 * @param nodes distinct nodes in any order; meant for a few (the recursion is unstable on many)
 * @param derivative m, 0 for interpolation
 * @returns one weight for each node, in the unit of the axis to the power -m
 * @throws RangeError where there are not more nodes than m
 * @example localWeights(0, Float64Array.of(-1, 0, 1), 2) // [1, -2, 1]
 * @see Fornberg 1988, Math. Comp. 51, 699-706
 */
export function localWeights(at: number, nodes: Float64Array, derivative: number): Float64Array {
  const n = nodes.length;
  if (!(n > derivative)) {
    throw new RangeError(`The derivative ${derivative} needs more than ${derivative} nodes, not ${n}`);
  }
  const rows: Float64Array[] = [];
  for (let m = 0; m <= derivative; m++) rows.push(new Float64Array(n));
  rows[0][0] = 1;
  let scale = 1;
  let distance = nodes[0] - at;
  for (let i = 1; i < n; i++) {
    const highest = Math.min(i, derivative);
    let product = 1;
    const before = distance;
    distance = nodes[i] - at;
    for (let j = 0; j < i; j++) {
      const gap = nodes[i] - nodes[j];
      product *= gap;
      if (j === i - 1) {
        for (let m = highest; m > 0; m--) {
          rows[m][i] = (scale * (m * rows[m - 1][i - 1] - before * rows[m][i - 1])) / product;
        }
        rows[0][i] = (-scale * before * rows[0][i - 1]) / product;
      }
      for (let m = highest; m > 0; m--) rows[m][j] = (distance * rows[m][j] - m * rows[m - 1][j]) / gap;
      rows[0][j] = (distance * rows[0][j]) / gap;
    }
    scale = product;
  }
  return rows[derivative];
}
