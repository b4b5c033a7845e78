/** A file's coordinates along one axis, compared with the grid that was declared. */

import { DataError } from "../scoring/data-error";
import type { GridKind } from "./grid-kind";
import { nodesOf } from "./grid-nodes";

/** One axis as declared: n nodes of a kind on [a, b]. */
export interface DeclaredAxis {
  name: string;
  kind: GridKind;
  n: number;
  a: number;
  b: number;
  isPeriodic: boolean;
}

/** What the comparison found. */
export interface MatchedAxis {
  /** The nodes to evaluate at, ascending: the declared kind's own, or the file's for `listed`. */
  nodes: Float64Array;
  /** The file runs from b to a. */
  isDescending: boolean;
  /** The file repeats the first node of a periodic axis at its end. */
  hasRepeatedEnd: boolean;
  /** Largest distance from the declared nodes, over L; 0 for `listed`. */
  offset: number;
}

/** Coordinates may differ from the declared nodes by this much of L; more is refused. */
const largestOffset = { double: 1e-8, single: 1e-5 };

const spoken = (axis: DeclaredAxis) => `a ${axis.kind} grid of ${axis.n} nodes on [${axis.a}, ${axis.b}]`;

/** The grid rounds to the interval: listed nodes may lie outside by this much of L. */
const outsideSlack = 1e-12;

function checkMonotone(coordinates: Float64Array, axis: DeclaredAxis): boolean {
  const isDescending = coordinates[0] > coordinates[coordinates.length - 1];
  const direction = isDescending ? -1 : 1;
  for (let j = 1; j < coordinates.length; j++) {
    if (direction * (coordinates[j] - coordinates[j - 1]) > 0) continue;
    throw new DataError(
      "grid/not-monotone",
      `The coordinate ${axis.name} is ${coordinates[j - 1]} at index ${j - 1} and ${coordinates[j]} at index ${j}. ` +
        "Coordinates must be strictly ascending or strictly descending; sort them together with the field.",
      `${axis.name}, index ${j}`,
    );
  }
  return isDescending;
}

function checkFinite(coordinates: Float64Array, axis: DeclaredAxis): void {
  const j = coordinates.findIndex((value) => !Number.isFinite(value));
  if (j < 0) return;
  throw new DataError(
    "values/not-finite",
    `The coordinate ${axis.name} is ${coordinates[j]} at index ${j}. Coordinates must be finite.`,
    `${axis.name}, index ${j}`,
  );
}

function checkLength(length: number, axis: DeclaredAxis): void {
  if (length === axis.n || (length === axis.n + 1 && mayRepeatEnd(axis))) return;
  throw new DataError(
    "grid/wrong-length",
    `The coordinate ${axis.name} has ${length} values, and the run declares n = ${axis.n} along ${axis.name}. ` +
      "Declare the number of nodes that the file holds.",
    axis.name,
  );
}

/** True where a file may repeat the first node of the axis at its end. */
const mayRepeatEnd = (axis: DeclaredAxis) =>
  axis.isPeriodic && (axis.kind === "uniform-periodic" || axis.kind === "listed");

function matchListed(ascending: Float64Array, axis: DeclaredAxis, isDescending: boolean): MatchedAxis {
  const length = axis.b - axis.a;
  const last = ascending.length - 1;
  const fileIndex = (j: number) => (isDescending ? last - j : j);
  for (const j of [0, last]) {
    const value = ascending[j];
    if (value >= axis.a - outsideSlack * length && value <= axis.b + outsideSlack * length) continue;
    throw new DataError(
      "grid/outside",
      `The coordinate ${axis.name} is ${value} at index ${fileIndex(j)}, outside [${axis.a}, ${axis.b}].`,
      `${axis.name}, index ${fileIndex(j)}`,
    );
  }
  const span = ascending[last] - ascending[0];
  const hasRepeatedEnd = axis.isPeriodic && span >= length * (1 - outsideSlack);
  const count = ascending.length - (hasRepeatedEnd ? 1 : 0);
  if (count !== axis.n) {
    throw new DataError(
      "grid/wrong-length",
      `The coordinate ${axis.name} holds ${count} nodes${hasRepeatedEnd ? " and a repeated end node" : ""}, and ` +
        `the run declares n = ${axis.n} along ${axis.name}.`,
      axis.name,
    );
  }
  return { nodes: ascending.slice(0, count), isDescending, hasRepeatedEnd, offset: 0 };
}

/**
 * Compares a file's coordinates with the declared grid.
 *
 * A difference above 1e-8 L (1e-5 L for single precision) is refused. Descending coordinates are accepted, and so is
 * a repeated end node on a periodic axis. On a `listed` grid the coordinates decide.
 *
 * @param coordinates as in the file, in the unit of the axis
 * @param axis what was declared
 * @param isSingle the coordinates are single precision
 * @returns the nodes to evaluate at, ascending, and what was found
 * @throws DataError `grid/wrong-length`, `grid/not-monotone`, `grid/coordinates-off`, `grid/outside`,
 *   `values/not-finite`
 * @example matchCoordinates(x, { name: "x", kind: "uniform", n: 33, a: 0, b: 1, isPeriodic: false }, false).nodes
 * @see the page /scoring, "Grids"
 */
export function matchCoordinates(
  coordinates: Float64Array,
  axis: DeclaredAxis,
  isSingle: boolean,
): MatchedAxis {
  checkLength(coordinates.length, axis);
  checkFinite(coordinates, axis);
  const isDescending = checkMonotone(coordinates, axis);
  const ascending = isDescending ? coordinates.slice().reverse() : coordinates;
  if (axis.kind === "listed") return matchListed(ascending, axis, isDescending);
  const nodes = nodesOf(axis.kind, axis.n, axis.a, axis.b);
  const length = axis.b - axis.a;
  const allowed = (isSingle ? largestOffset.single : largestOffset.double) * length;
  const count = coordinates.length;
  let offset = 0;
  for (let i = 0; i < count; i++) {
    const j = isDescending ? count - 1 - i : i;
    const expected = j < axis.n ? nodes[j] : axis.b;
    const distance = Math.abs(coordinates[i] - expected);
    if (distance > offset) offset = distance;
    if (distance <= allowed) continue;
    throw new DataError(
      "grid/coordinates-off",
      `The coordinate ${axis.name} is ${coordinates[i]} at index ${i}, where ${spoken(axis)} has ${expected}. ` +
        `They may differ by ${allowed.toPrecision(3)}. Declare the grid that the file is on, or "listed".`,
      `${axis.name}, index ${i}`,
    );
  }
  return { nodes, isDescending, hasRepeatedEnd: count > axis.n, offset: offset / length };
}
