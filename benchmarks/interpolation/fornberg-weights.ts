/**
 * Weights of the finite-difference formula for a derivative on arbitrary nodes.
 *
 * @param derivative 0 for interpolation, 1, 2, ...
 * @param at where the derivative is taken
 * @param nodes distinct, more of them than the derivative's order
 * @returns one weight for each node; the sum of weight times value approximates the derivative
 * @throws RangeError where there are too few nodes
 * @example fornbergWeights(2, 0, [-1, 0, 1]) // [1, -2, 1]
 * @see B. Fornberg, Generation of finite difference formulas on arbitrarily spaced grids, Math. Comp. 51 (1988) 699-706
 */
export function fornbergWeights(derivative: number, at: number, nodes: ArrayLike<number>): Float64Array {
  const count = nodes.length;
  if (!(derivative >= 0) || count <= derivative) {
    throw new RangeError(
      `a derivative of order ${derivative} needs more than ${derivative} nodes, not ${count}`,
    );
  }
  // weights[m][j]: weight of node j in the formula for the derivative of order m on the nodes so far.
  const weights = Array.from({ length: derivative + 1 }, () => new Float64Array(count));
  weights[0][0] = 1;
  let lastProduct = 1;
  for (let i = 1; i < count; i++) {
    let product = 1;
    const most = Math.min(i, derivative);
    for (let j = 0; j < i; j++) {
      const gap = nodes[i] - nodes[j];
      product *= gap;
      if (j === i - 1) {
        for (let m = most; m >= 0; m--) {
          const lower = m === 0 ? 0 : m * weights[m - 1][i - 1];
          weights[m][i] = (lastProduct / product) * (lower - (nodes[i - 1] - at) * weights[m][i - 1]);
        }
      }
      for (let m = most; m >= 0; m--) {
        const lower = m === 0 ? 0 : m * weights[m - 1][j];
        weights[m][j] = ((nodes[i] - at) * weights[m][j] - lower) / gap;
      }
    }
    lastProduct = product;
  }
  return weights[derivative];
}

/**
 * Weights of the centred formula of even order on a uniform grid of spacing 1.
 *
 * @param derivative 1 or more
 * @param order of accuracy, even
 * @returns weights of the nodes -r..r; divide by h to the power of the derivative
 * @throws RangeError where the order is not even
 * @example centredWeights(1, 4) // [1/12, -2/3, 0, 2/3, -1/12]
 * @see Fornberg 1988, table 1
 */
export function centredWeights(derivative: number, order: number): Float64Array {
  if (order < 2 || order % 2 !== 0) throw new RangeError(`a centred formula has an even order, not ${order}`);
  const reach = Math.floor((derivative + 1) / 2) + order / 2 - 1;
  const weights = fornbergWeights(
    derivative,
    0,
    Array.from({ length: 2 * reach + 1 }, (_, j) => j - reach),
  );
  // Symmetric to the last bit, so that an odd formula annihilates constants exactly.
  const parity = derivative % 2 === 0 ? 1 : -1;
  return weights.map((weight, j) => (weight + parity * weights[2 * reach - j]) / 2);
}
