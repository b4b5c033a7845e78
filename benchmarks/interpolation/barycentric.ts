/** The polynomial through all nodes of a grid, by the barycentric formula. */

import type { GridKind } from "../grids/grid-kind";

/**
 * Barycentric weights of a grid, up to a common factor.
 *
 * Chebyshev grids have them in closed form. Elsewhere they are products of distances, gathered as logarithms so that
 * thousands of nodes neither overflow nor underflow.
 *
 * @param kind kind of grid
 * @param nodes its nodes, ascending
 * @returns one weight for each node, the largest of modulus 1
 * @example barycentricWeights("chebyshev-lobatto", nodes)
 * @see Berrut and Trefethen 2004, SIAM Review 46, 501-517, equations 3.2, 5.3 and 5.4
 */
export function barycentricWeights(kind: GridKind, nodes: Float64Array): Float64Array {
  const n = nodes.length;
  const weights = new Float64Array(n);
  if (kind === "chebyshev-lobatto" || kind === "chebyshev-gauss") {
    for (let j = 0; j < n; j++) {
      const size =
        kind === "chebyshev-gauss"
          ? Math.sin((Math.PI * (2 * j + 1)) / (2 * n))
          : j % (n - 1) === 0
            ? 0.5
            : 1;
      weights[j] = j % 2 === 0 ? size : -size;
    }
    return weights;
  }
  const sizes = new Float64Array(n);
  let largest = -Infinity;
  for (let j = 0; j < n; j++) {
    let logarithm = 0;
    for (let k = 0; k < n; k++) if (k !== j) logarithm -= Math.log(Math.abs(nodes[j] - nodes[k]));
    sizes[j] = logarithm;
    largest = Math.max(largest, logarithm);
  }
  for (let j = 0; j < n; j++) weights[j] = ((n - 1 - j) % 2 === 0 ? 1 : -1) * Math.exp(sizes[j] - largest);
  return weights;
}

/**
 * Weights with which the values at the nodes make the polynomial's value at one place.
 *
 * @param nodes nodes of the grid
 * @param barycentric their weights, from `barycentricWeights`
 * @param at place of evaluation
 * @param out optional, written to and returned; one number for each node
 * @returns one weight for each node; they sum to 1
 * @example polynomialValueWeights(nodes, barycentric, 0.3)
 * @see Berrut and Trefethen 2004, equation 4.2
 */
export function polynomialValueWeights(
  nodes: Float64Array,
  barycentric: Float64Array,
  at: number,
  out: Float64Array = new Float64Array(nodes.length),
): Float64Array {
  let sum = 0;
  for (let j = 0; j < nodes.length; j++) {
    const distance = at - nodes[j];
    if (distance === 0) {
      out.fill(0);
      out[j] = 1;
      return out;
    }
    out[j] = barycentric[j] / distance;
    sum += out[j];
  }
  for (let j = 0; j < nodes.length; j++) out[j] /= sum;
  return out;
}

/**
 * Weights with which the values at the nodes make the polynomial's first derivative at one place.
 *
 * @param nodes nodes of the grid
 * @param barycentric their weights
 * @param at place of evaluation, a node or not
 * @returns one weight for each node, in the inverse unit of the axis; they sum to 0
 * @example polynomialSlopeWeights(nodes, barycentric, 1)
 * @see Berrut and Trefethen 2004, section 9.3
 */
export function polynomialSlopeWeights(
  nodes: Float64Array,
  barycentric: Float64Array,
  at: number,
): Float64Array {
  const slopes = new Float64Array(nodes.length);
  const node = nodes.indexOf(at);
  if (node >= 0) {
    let sum = 0;
    for (let j = 0; j < nodes.length; j++) {
      if (j === node) continue;
      slopes[j] = barycentric[j] / barycentric[node] / (at - nodes[j]);
      sum += slopes[j];
    }
    slopes[node] = -sum;
    return slopes;
  }
  const values = polynomialValueWeights(nodes, barycentric, at);
  let shift = 0;
  for (let j = 0; j < nodes.length; j++) shift += values[j] / (at - nodes[j]);
  for (let j = 0; j < nodes.length; j++) slopes[j] = values[j] * (shift - 1 / (at - nodes[j]));
  return slopes;
}
