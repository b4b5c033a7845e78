/** Nodes of every kind of grid along one axis, and the intervals that refinement divides. */

import type { GridKind } from "./grid-kind";
import { gaussLegendre, gaussLobatto } from "./legendre-rule";

/** Grid kinds whose nodes follow from their number alone. */
export type FormulaGridKind = Exclude<GridKind, "listed">;

function checkAxis(n: number, a: number, b: number): void {
  if (!Number.isInteger(n) || n < 2)
    throw new RangeError(`A grid needs a whole number of nodes from 2 on, not ${n}`);
  if (!(b > a) || !Number.isFinite(b - a))
    throw new RangeError(`An interval [a, b] needs a < b, not [${a}, ${b}]`);
}

/** mid + (L/2) x for nodes x on [-1, 1]. */
function scaleToInterval(unit: Float64Array, a: number, b: number): Float64Array {
  const middle = (a + b) / 2;
  const half = (b - a) / 2;
  return unit.map((x) => (x === -1 ? a : x === 1 ? b : middle + half * x));
}

/**
 * The nodes of a grid of n nodes along [a, b], ascending.
 *
 * Ends that are nodes are exactly a and b. The cosines of the Chebyshev grids are computed as sines of the distance
 * from the middle, so that the nodes are exactly symmetric.
 *
 * @param kind every kind but `listed`, whose nodes only the file knows
 * @param n number of nodes, 2 or more
 * @param a left end, in the unit of the axis
 * @param b right end, above a
 * @returns n nodes
 * @throws RangeError where n, a, b do not make a grid, or the kind is `listed`
 * @example nodesOf("uniform-periodic", 4, 0, 1) // [0, 0.25, 0.5, 0.75]
 * @see LeVeque 2007 (uniform grids); Trefethen 2000, chapter 6, and 2013 (Chebyshev); Canuto et al. 2006, section 2.3
 */
export function nodesOf(kind: GridKind, n: number, a: number, b: number): Float64Array {
  checkAxis(n, a, b);
  const length = b - a;
  const nodes = new Float64Array(n);
  switch (kind) {
    case "uniform-periodic":
      for (let j = 0; j < n; j++) nodes[j] = a + (j * length) / n;
      return nodes;
    case "uniform":
      for (let j = 0; j < n; j++) nodes[j] = a + (j * length) / (n - 1);
      nodes[n - 1] = b;
      return nodes;
    case "cell-centred":
      for (let j = 0; j < n; j++) nodes[j] = a + ((j + 0.5) * length) / n;
      return nodes;
    case "chebyshev-lobatto":
      for (let j = 0; j < n; j++) nodes[j] = Math.sin((Math.PI * (2 * j - n + 1)) / (2 * (n - 1)));
      return scaleToInterval(nodes, a, b);
    case "chebyshev-gauss":
      for (let j = 0; j < n; j++) nodes[j] = Math.sin((Math.PI * (2 * j - n + 1)) / (2 * n));
      return scaleToInterval(nodes, a, b);
    case "legendre-lobatto":
      return scaleToInterval(gaussLobatto(n).nodes, a, b);
    case "legendre-gauss":
      return scaleToInterval(gaussLegendre(n).nodes, a, b);
    case "listed":
      throw new RangeError("The nodes of a listed grid are the file's own coordinates");
  }
}

/**
 * True where both ends of the axis are nodes, so that n nodes make n - 1 intervals.
 *
 * A listed grid is counted by its nodes on periodic axes and by its gaps on bounded ones.
 *
 * @example hasBothEnds("chebyshev-lobatto") // true
 * @see Canuto et al. 2006, section 2.3 (Gauss and Gauss-Lobatto points)
 */
export function hasBothEnds(kind: GridKind, isPeriodic = false): boolean {
  if (kind === "listed") return !isPeriodic;
  return kind === "uniform" || kind === "chebyshev-lobatto" || kind === "legendre-lobatto";
}

/**
 * The number of intervals s that refinement divides: n on periodic, cell-centred and Gauss grids, n - 1 where both
 * ends are nodes. Orders, fits and interpolation use s; people are shown n.
 *
 * @param n number of nodes
 * @param isPeriodic only decides for `listed` grids
 * @example intervalsOf("uniform", 33) // 32
 * @see LeVeque 2007, section 2.4 (h = L/(m+1) for m inner nodes)
 */
export function intervalsOf(kind: GridKind, n: number, isPeriodic = false): number {
  return hasBothEnds(kind, isPeriodic) ? n - 1 : n;
}

/**
 * The nodes of a grid of s intervals: the inverse of `intervalsOf`.
 *
 * @param s intervals; need not be whole
 * @example nodesOfIntervals("uniform", 32) // 33
 * @see LeVeque 2007, section 2.4
 */
export function nodesOfIntervals(kind: GridKind, s: number, isPeriodic = false): number {
  return hasBothEnds(kind, isPeriodic) ? s + 1 : s;
}
