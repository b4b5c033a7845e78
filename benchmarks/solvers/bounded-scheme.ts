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

/** alpha u + beta du/dn = g at both ends, n outward. */
export interface EndCoefficients {
  a: { alpha: number; beta: number };
  b: { alpha: number; beta: number };
}

/** Data g of both ends, the lower first. */
export type EndData = readonly [number, number];

/** A second derivative with the end conditions built in. */
export interface ClosedOperator {
  /** Indices of the nodes that are unknowns. */
  unknowns: number[];
  /** The second derivative at the unknowns, but for the part of the data. */
  matrix: DenseMatrix;
  /** What a unit of each end's data adds to the second derivative. */
  dataColumns: readonly [Float64Array, Float64Array];
  /** Values at every node from those of the unknowns and the data. */
  extend(u: Float64Array, data?: EndData): Float64Array;
}

const noData: EndData = [0, 0];

/**
 * The second derivative on [a, b] with the end conditions built in.
 *
 * Differences of second order use ghost points at ends with a derivative condition and drop the node at Dirichlet
 * ends. Chebyshev collocation eliminates both end values by the two boundary rows.
 *
 * @param scheme of the two
 * @param nodes number of nodes, 3 or more
 * @param ends coefficients of the conditions
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
  const column = (end: "a" | "b") => {
    const { alpha, beta } = ends[end];
    const out = new Float64Array(unknowns.length);
    const at = end === "a" ? 0 : unknowns.length - 1;
    // A ghost value holds 2 h g/beta; a Dirichlet value g/alpha enters at the node beside it.
    out[at] = beta !== 0 ? 2 / (beta * h) : 1 / (alpha * h * h);
    return out;
  };
  const extend = (u: Float64Array, data = noData) => {
    const out = placeAt(unknowns, u, nodes);
    if (ends.a.beta === 0) out[0] = data[0] / ends.a.alpha;
    if (ends.b.beta === 0) out[last] = data[1] / ends.b.alpha;
    return out;
  };
  return { unknowns, matrix, dataColumns: [column("a"), column("b")], extend };
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
  // What a unit of each end's data adds to both end values.
  const [fromA, fromB] = [
    { left: s / determinant, right: -r / determinant },
    { left: -q / determinant, right: p / determinant },
  ];
  const column = (ofUnit: { left: number; right: number }) =>
    Float64Array.from(unknowns, (i) => entry(i, 0) * ofUnit.left + entry(i, last) * ofUnit.right);
  const extend = (u: Float64Array, data = noData) => {
    const out = placeAt(unknowns, u, nodes);
    const sum = (weights: number[]) => weights.reduce((total, weight, k) => total + weight * u[k], 0);
    out[0] = sum(left) + fromA.left * data[0] + fromB.left * data[1];
    out[last] = sum(right) + fromA.right * data[0] + fromB.right * data[1];
    return out;
  };
  return { unknowns, matrix, dataColumns: [column(fromA), column(fromB)], extend };
}
