/** A run's file as fields on the declared grid: shapes checked, orientation settled, every value finite. */

import type { FieldArray, FieldFile } from "../formats/field-file";
import { nodesOf } from "../grids/grid-nodes";
import { matchCoordinates, type DeclaredAxis, type MatchedAxis } from "../grids/match-coordinates";
import type { GridValues } from "../norms/error-norms";
import { findNonFinite } from "../norms/finite-values";
import type { ProblemDefinition } from "../problems/definition";
import { DataError } from "./data-error";
import { declaredAxes } from "./declared-grid";
import type { Declaration, RunDeclaration } from "./declaration";

/** One axis of a run: what was declared, and what the file says of it. */
export interface RunAxis extends DeclaredAxis, Omit<MatchedAxis, "offset"> {
  /** Null where the file has no coordinates along the axis. */
  offset: number | null;
}

/** A run on its grid. */
export interface RunFields {
  axes: RunAxis[];
  /** Scored fields in the problem's order; one set of values, row-major and ascending, for each output time. */
  fields: { name: string; array: FieldArray; times: GridValues[] }[];
  /** Output times; a single null for a steady problem. */
  times: (number | null)[];
}

const spokenShape = (shape: readonly number[]) => `(${shape.join(", ")}${shape.length === 1 ? "," : ""})`;

/** Length of an array that counts as 1-D: (N,), (N, 1) or (1, N). */
function lengthOfVector(shape: readonly number[]): number | null {
  if (shape.length === 1) return shape[0];
  if (shape.length === 2 && (shape[0] === 1 || shape[1] === 1)) return shape[0] * shape[1];
  return null;
}

function readCoordinates(name: string, array: FieldArray): Float64Array {
  if (array.imaginary) {
    throw new DataError("values/complex", `The coordinate ${name} is complex; coordinates are real.`, name);
  }
  if (lengthOfVector(array.shape) === null) {
    throw new DataError(
      "grid/wrong-shape",
      `The coordinate ${name} has shape ${spokenShape(array.shape)}; expected was one number for each node along ` +
        `the axis, shape (N,).`,
      name,
    );
  }
  return array.values;
}

/** Places an axis from the file's coordinates, or from the declaration alone. */
function placeAxis(axis: DeclaredAxis, declaration: Declaration, file: FieldFile): RunAxis {
  const array = file.arrays.get(axis.name);
  if (array) {
    const isSingle = array.numberType === "float32" || declaration.precision === "float32";
    return { ...axis, ...matchCoordinates(readCoordinates(axis.name, array), axis, isSingle) };
  }
  if (axis.kind === "listed") {
    throw new DataError(
      "grid/no-coordinates",
      `The grid along ${axis.name} is declared as listed, and the file has no array ${axis.name}. ` +
        "Add the coordinates of the nodes to the file.",
      axis.name,
    );
  }
  const nodes = nodesOf(axis.kind, axis.n, axis.a, axis.b);
  const isDescending = declaration.grid[axis.name as "x" | "y"]?.descending ?? false;
  return { ...axis, nodes, isDescending, hasRepeatedEnd: false, offset: null };
}

/** Output times, and a check of the file's own where it states them. */
function readTimes(problem: ProblemDefinition, file: FieldFile): (number | null)[] {
  if (problem.classification.isSteady) return [null];
  const times = problem.outputTimes;
  const array = file.arrays.get("t");
  if (!array) return times;
  const stated = array.values;
  if (stated.length !== times.length) {
    throw new DataError(
      "grid/wrong-times",
      `The file states ${stated.length} output times in t; the problem asks for ${times.length}: ${times.join(", ")}.`,
      "t",
    );
  }
  const slack = 1e-6 * Math.max(...times.map((time) => Math.abs(time)));
  const wrong = times.findIndex((time, k) => !(Math.abs(stated[k] - time) <= slack));
  if (wrong >= 0) {
    throw new DataError(
      "grid/wrong-times",
      `The file states t = ${stated[wrong]} at index ${wrong}; the problem asks for the field at t = ${times[wrong]}.`,
      `t, index ${wrong}`,
    );
  }
  return times;
}

/** Takes the field's shape apart, or refuses it with both shapes. Marks axes whose end node is repeated. */
function settleShape(name: string, array: FieldArray, axes: RunAxis[], timeCount: number): void {
  const leading = timeCount > 1 ? [timeCount] : [];
  const spatial =
    timeCount === 1 && axes.length === 1 && lengthOfVector(array.shape) !== null
      ? [array.values.length]
      : array.shape.slice(leading.length);
  const isLeadingRight = leading.length === 0 || array.shape[0] === timeCount;
  const fits =
    isLeadingRight &&
    spatial.length === axes.length &&
    axes.every((axis, i) => spatial[i] === axis.n + (axis.hasRepeatedEnd ? 1 : 0));
  if (fits) return;
  const mayRepeat =
    isLeadingRight &&
    spatial.length === axes.length &&
    axes.every(
      (axis, i) =>
        spatial[i] === axis.n ||
        (spatial[i] === axis.n + 1 && axis.offset === null && axis.kind === "uniform-periodic"),
    );
  if (mayRepeat) {
    axes.forEach((axis, i) => {
      axis.hasRepeatedEnd = spatial[i] === axis.n + 1;
    });
    return;
  }
  const expected = [...leading, ...axes.map((axis) => axis.n + (axis.hasRepeatedEnd ? 1 : 0))];
  throw new DataError(
    "values/wrong-shape",
    `The field ${name} has shape ${spokenShape(array.shape)}; expected was ${spokenShape(expected)}` +
      `${timeCount > 1 ? " (output times, then the axes)" : ""}, as n = ${axes.map((axis) => axis.n).join(" x ")} ` +
      "is declared. Correct n, or the array.",
    name,
  );
}

/** Copies one time level, dropping repeated ends and reversing descending axes. */
function arrange(source: Float64Array, axes: readonly RunAxis[]): Float64Array {
  if (axes.every((axis) => !axis.isDescending && !axis.hasRepeatedEnd)) return source;
  const [outer, inner] = axes.length === 2 ? axes : [null, axes[0]];
  const rows = outer ? outer.n : 1;
  const stored = inner.n + (inner.hasRepeatedEnd ? 1 : 0);
  const storedRows = outer ? outer.n + (outer.hasRepeatedEnd ? 1 : 0) : 1;
  const result = new Float64Array(rows * inner.n);
  for (let i = 0; i < rows; i++) {
    const row = outer?.isDescending ? storedRows - 1 - i : i;
    for (let j = 0; j < inner.n; j++) {
      result[i * inner.n + j] = source[row * stored + (inner.isDescending ? stored - 1 - j : j)];
    }
  }
  return result;
}

/** A repeated end node that no coordinate vouches for must at least repeat the values. */
function checkRepeatedEnd(name: string, array: FieldArray, axes: readonly RunAxis[]): void {
  if (axes.length !== 1 || !axes[0].hasRepeatedEnd || axes[0].offset !== null) return;
  const count = axes[0].n + 1;
  const { values } = array;
  let largest = 0;
  for (const value of values) largest = Math.max(largest, Math.abs(value));
  for (let from = 0; from < values.length; from += count) {
    const first = values[from];
    const last = values[from + count - 1];
    if (Math.abs(first - last) <= 1e-5 * largest) continue;
    throw new DataError(
      "values/wrong-shape",
      `The field ${name} has shape ${spokenShape(array.shape)} and n = ${axes[0].n} is declared. The last value, ` +
        `${last}, does not repeat the first, ${first}, so it is not a repeated end node; correct n.`,
      name,
    );
  }
}

function checkFinite(name: string, array: FieldArray): void {
  for (const part of [array.values, array.imaginary]) {
    const bad = part && findNonFinite(part);
    if (!bad) continue;
    const place: number[] = [];
    let rest = bad.index;
    for (const length of [...array.shape].reverse()) {
      place.unshift(rest % length);
      rest = Math.floor(rest / length);
    }
    throw new DataError(
      "values/not-finite",
      `The field ${name} holds ${bad.count} value${bad.count === 1 ? " that is" : "s that are"} NaN or infinite, ` +
        `the first at index ${place.join(", ")} (counted from 0). Every value must be finite.`,
      `${name}, index ${place.join(", ")}`,
    );
  }
}

function findField(name: string, file: FieldFile, isComplex: boolean): FieldArray {
  const array = file.arrays.get(name);
  if (!array) {
    throw new DataError(
      "format/no-array",
      `The file has no array ${name}; it holds ${[...file.arrays.keys()].join(", ") || "none"}. ` +
        `Name the field ${name}.`,
      name,
    );
  }
  if (array.imaginary && !isComplex) {
    throw new DataError(
      "values/complex",
      `The field ${name} is stored as ${array.numberType}, and the problem's solution is real. Write the real part.`,
      name,
    );
  }
  return array;
}

/**
 * Reads a run's file onto the declared grid.
 *
 * @param problem the test problem
 * @param declaration what the submission declares
 * @param run the run's own declaration
 * @param file arrays as a format's reader gave them
 * @returns nodes, and each scored field at each output time, ascending and without repeated ends
 * @throws DataError where arrays are missing, of the wrong shape, complex, not finite, or off the declared grid
 * @example readRun(problem, declaration, run, readFieldFile("n32.npz", bytes)).fields[0].times
 * @see the page /scoring, "Grids" and "Bad data"
 */
export function readRun(
  problem: ProblemDefinition,
  declaration: Declaration,
  run: RunDeclaration,
  file: FieldFile,
): RunFields {
  const axes = declaredAxes(problem, declaration, run.n).map((axis) => placeAxis(axis, declaration, file));
  const times = readTimes(problem, file);
  const scored = problem.fields.filter((field) => field.isScored);
  const arrays = scored.map((field) => findField(field.name, file, field.values === "complex"));
  arrays.forEach((array, i) => {
    settleShape(scored[i].name, array, axes, times.length);
    checkFinite(scored[i].name, array);
    checkRepeatedEnd(scored[i].name, array, axes);
  });
  const fields = arrays.map((array, i) => {
    const level = array.values.length / times.length;
    const cut = (part: Float64Array, k: number) => arrange(part.subarray(k * level, (k + 1) * level), axes);
    const levels = times.map((_, k) => ({
      values: cut(array.values, k),
      imaginary: array.imaginary && cut(array.imaginary, k),
    }));
    return { name: scored[i].name, array, times: levels };
  });
  return { axes, fields, times };
}
