/** Rows of a table, one a node in any order, into arrays on the grid that they form. */

import { DataError } from "../scoring/data-error";

import type { FieldArray } from "./field-file";
import type { TableColumns } from "./table-columns";

interface GridAxis {
  name: string;
  /** Distinct coordinates; ascending, or in the order of the rows where a lone axis is strictly monotone. */
  coordinates: Float64Array;
  /** Position along the axis for each row. */
  positions: Int32Array;
}

/**
 * Arranges the columns of a table on the grid that its coordinates form.
 *
 * The axes are t, x, y in this order, as far as there are such columns; t is dropped as an axis where it has
 * a single value. A table along one axis whose coordinates are strictly monotone keeps its order, so that a
 * descending file is seen as such; all others come out ascending.
 *
 * @param columns from `readColumns`; `x` and at least one field must be there
 * @returns coordinates of shape (N), fields of shape ([Nt,] Nx[, Ny])
 * @throws DataError `format/no-column`, `values/not-finite`, `grid/duplicate-node` or `grid/missing-node`,
 *   naming the rows or the node
 * @example arrangeOnGrid({ names: ["x", "u"], values: [Float64Array.of(0, 1), Float64Array.of(2, 3)], rows: Uint32Array.of(2, 3), headerRow: 1 })
 * @see benchmarks/scoring for what is done with the coordinates
 */
export function arrangeOnGrid(columns: TableColumns): Map<string, FieldArray> {
  const columnOf = (name: string) => columns.values[columns.names.indexOf(name)];
  const axisNames = ["t", "x", "y"].filter((name) => columns.names.includes(name));
  const fieldNames = columns.names.filter((name) => !axisNames.includes(name));
  refuseMissingColumns(columns, fieldNames);
  for (const name of axisNames) refuseNotFinite(columns, name);
  const varying = axisNames.filter((name) => name !== "t" || !isConstant(columnOf(name)));
  const isLine = varying.length === 1;
  const axes = varying.map((name) => findAxis(name, columnOf(name), isLine));
  const target = findTargets(axes, columns.rows);

  const arrays = new Map<string, FieldArray>();
  for (const axis of axes) arrays.set(axis.name, tableArray([axis.coordinates.length], axis.coordinates));
  if (axisNames.length > varying.length) arrays.set("t", tableArray([1], columnOf("t").slice(0, 1)));
  const shape = axes.map((axis) => axis.coordinates.length);
  for (const name of fieldNames) {
    const column = columnOf(name);
    const values = new Float64Array(column.length);
    for (let i = 0; i < column.length; i++) values[target[i]] = column[i];
    arrays.set(name, tableArray([...shape], values));
  }
  return arrays;
}

function tableArray(shape: number[], values: Float64Array): FieldArray {
  return { shape, values, imaginary: null, numberType: "text", isFortranOrder: false };
}

function refuseMissingColumns(columns: TableColumns, fieldNames: string[]): void {
  const missing = columns.names.includes("x") ? "u" : "x";
  if (missing === "u" && fieldNames.length > 0) return;
  throw new DataError(
    "format/no-column",
    `The table has the columns ${columns.names.join(", ")} and lacks ${missing}. Expected were x, then y in two ` +
      "dimensions, t where there are several times, and the field u.",
    `row ${columns.headerRow}`,
  );
}

function refuseNotFinite(columns: TableColumns, name: string): void {
  const at = columns.names.indexOf(name);
  const index = columns.values[at].findIndex((value) => !Number.isFinite(value));
  if (index < 0) return;
  throw new DataError(
    "values/not-finite",
    `Row ${columns.rows[index]}, column ${at + 1} (${name}): the coordinate is ${columns.values[at][index]}. ` +
      "Coordinates must be finite.",
    `row ${columns.rows[index]}, column ${at + 1} (${name})`,
  );
}

function isConstant(column: Float64Array): boolean {
  return column.every((value) => value === column[0]);
}

function findAxis(name: string, column: Float64Array, isLine: boolean): GridAxis {
  if (isLine && isStrictlyMonotone(column)) {
    return {
      name,
      coordinates: column.slice(),
      positions: new Int32Array(column.length).map((_, i) => i),
    };
  }
  const coordinates = distinct(column);
  return { name, coordinates, positions: positionsIn(coordinates, column) };
}

/** Sorted; -0 and 0 are one value. */
function distinct(column: Float64Array): Float64Array {
  const sorted = column.slice().sort();
  let count = 0;
  for (let i = 0; i < sorted.length; i++) {
    if (count === 0 || sorted[i] !== sorted[count - 1]) sorted[count++] = sorted[i];
  }
  return sorted.slice(0, count);
}

/** Place of each value of the column among the sorted coordinates, by bisection. */
function positionsIn(coordinates: Float64Array, column: Float64Array): Int32Array {
  return new Int32Array(column.length).map((_, i) => {
    let [low, high] = [0, coordinates.length - 1];
    while (low < high) {
      const middle = (low + high) >> 1;
      if (coordinates[middle] < column[i]) low = middle + 1;
      else high = middle;
    }
    return low;
  });
}

function isStrictlyMonotone(column: Float64Array): boolean {
  if (column.length < 2) return true;
  const direction = Math.sign(column[1] - column[0]);
  for (let i = 1; i < column.length; i++) {
    if (Math.sign(column[i] - column[i - 1]) !== direction || direction === 0) return false;
  }
  return true;
}

/** Row-major place on the grid for each row; refuses unless each place is taken exactly once. */
function findTargets(axes: GridAxis[], rows: Uint32Array): Float64Array {
  const target = new Float64Array(rows.length);
  let nodeCount = 1;
  for (const axis of axes) {
    nodeCount *= axis.coordinates.length;
    for (let i = 0; i < target.length; i++) {
      target[i] = target[i] * axis.coordinates.length + axis.positions[i];
    }
  }
  if (isEachTakenOnce(target, nodeCount)) return target;
  throw explainGaps(axes, rows, target, nodeCount);
}

function isEachTakenOnce(target: Float64Array, nodeCount: number): boolean {
  if (target.length !== nodeCount) return false;
  const isTaken = new Uint8Array(nodeCount);
  for (const place of target) {
    if (isTaken[place] === 1) return false;
    isTaken[place] = 1;
  }
  return true;
}

function explainGaps(
  axes: GridAxis[],
  rows: Uint32Array,
  target: Float64Array,
  nodeCount: number,
): DataError {
  const sorted = target.slice().sort();
  // Beyond 2^53 different places may round to the same number.
  const isExact = Number.isSafeInteger(nodeCount);
  const repeated = isExact ? sorted.findIndex((place, i) => i > 0 && place === sorted[i - 1]) : -1;
  if (repeated >= 0) {
    const first = target.indexOf(sorted[repeated]);
    const second = target.indexOf(sorted[repeated], first + 1);
    return new DataError(
      "grid/duplicate-node",
      `Rows ${rows[first]} and ${rows[second]} are both at ${nodeName(axes, target[first])}. Write each node once` +
        `${axes.some(({ name }) => name === "t") ? "" : ", and a t column where there are several times"}.`,
      `row ${rows[second]}`,
    );
  }
  const gap = sorted.findIndex((place, i) => place !== i);
  const missing = gap < 0 ? sorted.length : gap;
  const counts = axes.map(({ name, coordinates }) => `${coordinates.length} distinct ${name}`).join(" and ");
  return new DataError(
    "grid/missing-node",
    `The ${rows.length} rows hold ${counts}, which makes ${nodeCount} nodes: ${nodeCount - rows.length} are missing, ` +
      `the first at ${nodeName(axes, missing)}.${closeHint(axes)}`,
    nodeName(axes, missing),
  );
}

function nodeName(axes: GridAxis[], place: number): string {
  const parts: string[] = [];
  let rest = place;
  for (const { name, coordinates } of [...axes].reverse()) {
    parts.unshift(`${name} = ${coordinates[rest % coordinates.length]}`);
    rest = Math.floor(rest / coordinates.length);
  }
  return parts.join(", ");
}

/** Coordinates that differ by rounding only are the usual reason for a grid that does not close. */
function closeHint(axes: GridAxis[]): string {
  for (const { name, coordinates } of axes) {
    const span = coordinates[coordinates.length - 1] - coordinates[0];
    for (let i = 1; i < coordinates.length; i++) {
      if (coordinates[i] - coordinates[i - 1] > 1e-9 * span) continue;
      return (
        ` Two ${name} differ by rounding only, ${coordinates[i - 1]} and ${coordinates[i]}: write a node's ` +
        "coordinate the same in all its rows."
      );
    }
  }
  return " Write one row for each node of the full grid.";
}
