/** Errors of a run when its file is read in another way than declared: what findings about mistakes rest on. */

import { normsOf, sumErrors, type GridValues } from "../norms/error-norms";
import type { ProblemDefinition } from "../problems/definition";
import { evaluateExact } from "../problems/exact-solution";
import type { RunFields } from "./read-run";

/** At most this many nodes of an axis are looked at for a shift in time. */
const sampledNodes = { 1: 512, 2: 32 };
/** At most this many nodes of an axis are compared under another reading. */
const comparedNodes = { 1: 4096, 2: 128 };
/** Places in [-T/20, T/20] at which the search for a shift begins. */
const shiftStarts = 8;
/** Beyond this the rounding of the data decides by what factor the error is smaller. */
const largestFactor = 1e12;

/** The first scored field at the last output time. */
function lastLevel(run: RunFields): { name: string; t: number | null; u: GridValues } {
  const field = run.fields[0];
  return { name: field.name, t: run.times[run.times.length - 1], u: field.times[field.times.length - 1] };
}

/** Indices of at most `limit` nodes spread over an axis. */
function spreadIndices(n: number, limit: number): number[] {
  const count = Math.min(n, limit);
  return Array.from({ length: count }, (_, k) => Math.floor((k * n) / count));
}

/** Values at the tensor product of some indices of each axis. */
function pick(values: Float64Array, columns: number, indices: readonly number[][]): Float64Array {
  const [outer, inner] = indices.length === 2 ? indices : [[0], indices[0]];
  const picked = new Float64Array(outer.length * inner.length);
  let at = 0;
  for (const i of outer) for (const j of inner) picked[at++] = values[i * columns + j];
  return picked;
}

/** The same of a complex field. */
function pickBoth(u: GridValues, columns: number, indices: readonly number[][]): GridValues {
  return {
    values: pick(u.values, columns, indices),
    imaginary: u.imaginary && pick(u.imaginary, columns, indices),
  };
}

/** Relative L2 norm over picked nodes, all weighing the same. */
function relativeL2(u: GridValues, exact: GridValues): number | null {
  return normsOf([sumErrors(u, exact, [new Float64Array(u.values.length).fill(1)])]).relL2;
}

/**
 * Relative L2 error when a periodic file is read as n - 1 intervals whose last node is the end. Taken on at most
 * 4096 nodes (128 x 128 in 2-D).
 *
 * @returns null where an axis is not `uniform-periodic`
 * @example endIncludedError(problem, run)
 * @see the page /scoring, "Findings"
 */
export function endIncludedError(problem: ProblemDefinition, run: RunFields): number | null {
  if (run.axes.some((axis) => axis.kind !== "uniform-periodic")) return null;
  const { name, t, u } = lastLevel(run);
  const limit = run.axes.length === 1 ? comparedNodes[1] : comparedNodes[2];
  const indices = run.axes.map((axis) => spreadIndices(axis.n, limit));
  const places = run.axes.map(({ n, a, b }, i) =>
    Float64Array.from(indices[i], (j) => a + (j * (b - a)) / (n - 1)),
  );
  const picked = pickBoth(u, run.axes[run.axes.length - 1].n, indices);
  return relativeL2(picked, evaluateExact(problem, name, t, places));
}

/**
 * Relative L2 error with the axes of a 2-D field exchanged. Taken on at most 128 x 128 nodes.
 *
 * @param exact u* at the run's nodes, at the last output time
 * @returns null in 1-D, or where the axes differ in their number of nodes
 * @example transposedError(run, exact)
 * @see the page /scoring, "Findings"
 */
export function transposedError(run: RunFields, exact: GridValues): number | null {
  const [first, second] = run.axes;
  if (!second || first.n !== second.n) return null;
  const { u } = lastLevel(run);
  const indices = spreadIndices(first.n, comparedNodes[2]);
  const count = indices.length;
  const picked = pickBoth(u, first.n, [indices, indices]);
  const exchange = (part: Float64Array) =>
    part.map((_, k) => part[(k % count) * count + Math.floor(k / count)]);
  const exchanged = {
    values: exchange(picked.values),
    imaginary: picked.imaginary && exchange(picked.imaginary),
  };
  return relativeL2(exchanged, pickBoth(exact, first.n, [indices, indices]));
}

/** The run's values on a sparse sub-grid, and the coordinates of that sub-grid. */
function sampleRun(run: RunFields): { coordinates: Float64Array[]; values: Float64Array } {
  const { u } = lastLevel(run);
  const limit = run.axes.length === 1 ? sampledNodes[1] : sampledNodes[2];
  const indices = run.axes.map((axis) => spreadIndices(axis.n, limit));
  const coordinates = run.axes.map((axis, i) => Float64Array.from(indices[i], (j) => axis.nodes[j]));
  const values = pick(u.values, run.axes[run.axes.length - 1].n, indices);
  return { coordinates, values };
}

/**
 * The shift q of the output time, |q| <= T/20, at which u*(x, t + q) is nearest the run, and by what factor the error
 * is smaller there. Looked for on at most 512 nodes (32 x 32 in 2-D) by Gauss-Newton steps from the best of 9 places.
 *
 * @returns null for steady or complex problems, and where no shift helps
 * @example findTimeShift(problem, run)?.shift
 * @see Nocedal and Wright 2006, section 10.3 (Gauss-Newton)
 */
export function findTimeShift(
  problem: ProblemDefinition,
  run: RunFields,
): { shift: number; factor: number } | null {
  const { name, t, u } = lastLevel(run);
  if (t === null || u.imaginary || t === problem.initialTime) return null;
  const { coordinates, values } = sampleRun(run);
  const reach = Math.abs(t - problem.initialTime) / 20;
  const exactAt = (q: number) => evaluateExact(problem, name, t + q, coordinates).values;
  const squareAt = (exact: Float64Array) => {
    let sum = 0;
    for (let i = 0; i < values.length; i++) sum += (values[i] - exact[i]) ** 2;
    return sum;
  };
  const here = squareAt(exactAt(0));
  if (!(here > 0)) return null;
  let best = { shift: 0, square: here };
  for (let k = 0; k <= shiftStarts; k++) {
    const shift = reach * ((2 * k) / shiftStarts - 1);
    const square = squareAt(exactAt(shift));
    if (square < best.square) best = { shift, square };
  }
  best = refineShift(best, reach, { values, exactAt, squareAt });
  if (best.shift === 0) return null;
  const factor = Math.sqrt(here / Math.max(best.square, here / largestFactor ** 2));
  return { shift: best.shift, factor };
}

/** Gauss-Newton steps from a start, kept as far as each makes the error smaller. */
function refineShift(
  start: { shift: number; square: number },
  reach: number,
  fit: {
    values: Float64Array;
    exactAt: (q: number) => Float64Array;
    squareAt: (exact: Float64Array) => number;
  },
): { shift: number; square: number } {
  let best = start;
  const step = reach * 1e-4;
  for (let pass = 0; pass < 6; pass++) {
    const exact = fit.exactAt(best.shift);
    const later = fit.exactAt(best.shift + step);
    const earlier = fit.exactAt(best.shift - step);
    let gradient = 0;
    let curvature = 0;
    for (let i = 0; i < exact.length; i++) {
      const rate = (later[i] - earlier[i]) / (2 * step);
      gradient += rate * (fit.values[i] - exact[i]);
      curvature += rate * rate;
    }
    if (!(curvature > 0)) return best;
    const shift = Math.max(-reach, Math.min(reach, best.shift + gradient / curvature));
    const square = fit.squareAt(fit.exactAt(shift));
    if (!(square < best.square)) return best;
    const hasSettled = square > best.square / 4;
    best = { shift, square };
    if (hasSettled) return best;
  }
  return best;
}
