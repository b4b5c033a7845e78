/** Reads n off a file, so that an author need not type what the file says already. */

import type { FieldArray, FieldFile } from "../formats/field-file";
import type { Axis, ProblemDefinition } from "../problems/definition";

/** A repeated end node lies one length of the domain from the first, to this share of the length. */
const endSlack = 1e-6;

function hasRepeatedEnd(axis: Axis, coordinates: FieldArray | undefined): boolean {
  if (axis.kind !== "periodic" || !coordinates || coordinates.values.length < 2) return false;
  const { values } = coordinates;
  const length = axis.b - axis.a;
  const span = Math.abs(values[values.length - 1] - values[0]);
  return Math.abs(span - length) <= endSlack * length;
}

/**
 * Proposes the nodes along each axis from a file's shapes and coordinates; a repeated end node of a periodic axis is
 * not counted. The proposal is checked by nothing but the file: `scoreRun` judges it.
 *
 * @param problem the test problem
 * @param file the arrays of one result file
 * @returns n along each axis of the problem; null where the file has no field of a shape that gives it
 * @example proposeNodes(problem, readFieldFile("n64.npy", bytes)) // [64]
 * @see the page /scoring, "Grids"
 */
export function proposeNodes(problem: ProblemDefinition, file: FieldFile): number[] | null {
  const name = problem.fields.find((field) => field.isScored)?.name ?? "u";
  const shape = file.arrays.get(name)?.shape;
  if (!shape) return null;
  const leading = problem.outputTimes.length > 1 ? 1 : 0;
  if (leading === 1 && shape[0] !== problem.outputTimes.length) return null;
  let lengths = shape.slice(leading);
  if (problem.axes.length === 1 && lengths.length === 2) lengths = lengths.filter((count) => count !== 1);
  if (lengths.length !== problem.axes.length) return null;
  const n = problem.axes.map(
    (axis, i) => lengths[i] - (hasRepeatedEnd(axis, file.arrays.get(axis.name)) ? 1 : 0),
  );
  return n.every((count) => count > 0) ? n : null;
}
