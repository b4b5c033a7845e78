import type { GridKind } from "../grids/grid-kind";
import { chebyshevMatrix, chebyshevSecondMatrix } from "./chebyshev-matrix";
import { type DenseMatrix, denseMatrix } from "./dense-matrix";

/** A discretisation on a bounded axis whose ends are nodes. */
export interface BoundedScheme {
  gridKind: GridKind;
  kind: "secondOrder" | "chebyshev";
}

export const secondOrderScheme: BoundedScheme = { gridKind: "uniform", kind: "secondOrder" };
export const chebyshevScheme: BoundedScheme = { gridKind: "chebyshev-lobatto", kind: "chebyshev" };

/** alpha u + beta du/dn = 0 at both ends, n outward. */
export interface EndCoefficients {
  a: { alpha: number; beta: number };
  b: { alpha: number; beta: number };
}

/** A second derivative with homogeneous end conditions built in. */
export interface ClosedOperator {
  /** Indices of the nodes that are unknowns. */
  unknowns: number[];
  /** The second derivative at the unknowns. */
  matrix: DenseMatrix;
  /** Values at every node from those of the unknowns. */
  extend(u: Float64Array): Float64Array;
}

/**
 * The second derivative on [a, b] with the end conditions built in.
 *
 * Differences of second order use ghost points at ends with a derivative condition and drop the node at Dirichlet
 * ends. Chebyshev collocation eliminates both end values by the two boundary rows.
 *
 * @param scheme of the two
 * @param nodes number of nodes, 3 or more
 * @param ends coefficients of the homogeneous conditions
 * @returns matrix, unknowns and extension to all nodes
 * @throws RangeError where there are fewer than three nodes
 * @example closedSecondDerivative(secondOrderScheme, 17, 0, 1, ends).unknowns.length // 15 of Dirichlet ends
 * @see R. J. LeVeque 2007, section 2.12 (ghost points); Trefethen 2000, chapters 7 and 13 (collocation)
 */
export function closedSecondDerivative(
  scheme: BoundedScheme,
  nodes: number,
  a: number,
  b: number,
  ends: EndCoefficients,
): ClosedOperator {
  if (nodes < 3)
    throw new RangeError(`a second derivative with closures needs three nodes or more, not ${nodes}`);
  return scheme.kind === "chebyshev"
    ? closeByElimination(nodes, a, b, ends)
    : closeByGhosts(nodes, a, b, ends);
}

function closeByGhosts(nodes: number, a: number, b: number, ends: EndCoefficients): ClosedOperator {
  const h = (b - a) / (nodes - 1);
  const last = nodes - 1;
  const isUnknown = (j: number) => (j === 0 ? ends.a.beta !== 0 : j === last ? ends.b.beta !== 0 : true);
  const unknowns = Array.from({ length: nodes }, (_, j) => j).filter(isUnknown);
  const matrix = denseMatrix(unknowns.length, (row, column) => {
    const [i, j] = [unknowns[row], unknowns[column]];
    const isEnd = i === 0 || i === last;
    if (Math.abs(i - j) > 1) return 0;
    if (i !== j) return (isEnd ? 2 : 1) / (h * h);
    if (!isEnd) return -2 / (h * h);
    // The ghost value is u_inner - 2 h (alpha/beta) u_end.
    const { alpha, beta } = i === 0 ? ends.a : ends.b;
    return (-2 - (2 * h * alpha) / beta) / (h * h);
  });
  return { unknowns, matrix, extend: (u) => placeAt(unknowns, u, nodes) };
}

function placeAt(unknowns: number[], u: Float64Array, nodes: number): Float64Array {
  const out = new Float64Array(nodes);
  unknowns.forEach((node, k) => (out[node] = u[k]));
  return out;
}

function closeByElimination(nodes: number, a: number, b: number, ends: EndCoefficients): ClosedOperator {
  const last = nodes - 1;
  const first = chebyshevMatrix(nodes, a, b);
  const second = chebyshevSecondMatrix(nodes, a, b);
  const boundaryRow = (end: "a" | "b", j: number) => {
    const node = end === "a" ? 0 : last;
    const { alpha, beta } = ends[end];
    const outward = end === "a" ? -1 : 1;
    return (j === node ? alpha : 0) + beta * outward * first.values[node * nodes + j];
  };
  const unknowns = Array.from({ length: nodes - 2 }, (_, k) => k + 1);
  const [p, q, r, s] = [
    boundaryRow("a", 0),
    boundaryRow("a", last),
    boundaryRow("b", 0),
    boundaryRow("b", last),
  ];
  const determinant = p * s - q * r;
  // Both end values as sums over the inner ones.
  const left = unknowns.map((j) => -(s * boundaryRow("a", j) - q * boundaryRow("b", j)) / determinant);
  const right = unknowns.map((j) => -(p * boundaryRow("b", j) - r * boundaryRow("a", j)) / determinant);
  const entry = (i: number, j: number) => second.values[i * nodes + j];
  const matrix = denseMatrix(
    unknowns.length,
    (row, column) =>
      entry(row + 1, column + 1) + entry(row + 1, 0) * left[column] + entry(row + 1, last) * right[column],
  );
  const extend = (u: Float64Array) => {
    const out = placeAt(unknowns, u, nodes);
    out[0] = left.reduce((total, weight, k) => total + weight * u[k], 0);
    out[last] = right.reduce((total, weight, k) => total + weight * u[k], 0);
    return out;
  };
  return { unknowns, matrix, extend };
}
