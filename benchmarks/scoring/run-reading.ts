/** Facts about a run's file that findings rest on. */

import { reconstructLines } from "../interpolation/reconstruct-lines";
import type { GridValues } from "../norms/error-norms";
import type { ProblemDefinition } from "../problems/definition";
import { evaluateExact } from "../problems/exact-solution";
import type { FieldFile } from "../formats/field-file";
import { reconstructionAlong } from "./between-nodes";
import { endIncludedError, findTimeShift, transposedError } from "./misreadings";
import { holdsSinglePrecision, mostSignificantDigits } from "./number-facts";
import type { RunAxis, RunFields } from "./read-run";
import type { Norms, RunReading } from "./result";

const machineEpsilon = 2 ** -52;
/** Values kept for the comparison of runs, along one axis of a 1-D or 2-D grid. */
const mostSamples = { 1: 256, 2: 16 };
/** Places between the nodes at which the interpolant of u* is tried, in 1-D. */
const interpolantPlaces = 128;
/** A misreading is only looked for in runs with an error above round-off. */
const roundOffLevel = 1e-13;

/** The smallest divisor of the intervals that leaves at most `limit` of them. */
function sampleStride(intervals: number, limit: number): number {
  for (let stride = 1; stride <= intervals; stride++) {
    if (intervals % stride === 0 && intervals / stride <= limit) return stride;
  }
  return intervals;
}

/** Values and errors at every stride-th node of the first field, real data on grids that share nodes by index. */
function sampleValues(
  run: RunFields,
  intervals: readonly number[],
  exact: Float64Array,
): RunReading["sample"] {
  const field = run.fields[0];
  const u = field.times[field.times.length - 1];
  if (u.imaginary || run.axes.some((axis) => axis.kind === "listed")) return null;
  const limit = mostSamples[run.axes.length === 1 ? 1 : 2];
  const strides = intervals.map((count) => sampleStride(count, limit));
  const [outer, inner] = run.axes.length === 2 ? run.axes : [null, run.axes[0]];
  const values: number[] = [];
  const errors: number[] = [];
  for (let i = 0; i < (outer?.n ?? 1); i += outer ? strides[0] : 1) {
    for (let j = 0; j < inner.n; j += strides[strides.length - 1]) {
      const at = i * inner.n + j;
      values.push(u.values[at]);
      errors.push(u.values[at] - exact[at]);
    }
  }
  return { strides, values, errors };
}

/** Error of the interpolant of u* on a 1-D run's nodes, over max |u*|; null where the grid has no interpolant. */
function interpolantError(
  problem: ProblemDefinition,
  run: RunFields,
  exact: GridValues,
  exactMax: number,
): number | null {
  const [axis] = run.axes;
  const hasInterpolant = axis.kind !== "listed" && axis.n <= 4096 && (axis.isPeriodic || isSpectral(axis));
  if (run.axes.length > 1 || exact.imaginary || !hasInterpolant) return null;
  const places = Float64Array.from(
    { length: interpolantPlaces },
    (_, m) => axis.a + ((m + 0.5) * (axis.b - axis.a)) / interpolantPlaces,
  );
  const along = reconstructionAlong(axis, { kind: "polynomial" });
  const values = reconstructLines(exact.values, { ...axis, edges: null }, along, places);
  const truth = evaluateExact(problem, run.fields[0].name, run.times[run.times.length - 1], [places]).values;
  let largest = 0;
  for (let i = 0; i < truth.length; i++) largest = Math.max(largest, Math.abs(values[i] - truth[i]));
  return largest / exactMax;
}

const isSpectral = (axis: RunAxis) => axis.kind.startsWith("chebyshev") || axis.kind.startsWith("legendre");

/** Largest gap of listed axes, in units of L/N. */
function largestGap(run: RunFields): number | null {
  let largest: number | null = null;
  for (const axis of run.axes) {
    if (axis.kind !== "listed") continue;
    const { nodes, a, b, n } = axis;
    let gap = axis.isPeriodic ? nodes[0] + (b - a) - nodes[n - 1] : Math.max(nodes[0] - a, b - nodes[n - 1]);
    for (let j = 1; j < n; j++) gap = Math.max(gap, nodes[j] - nodes[j - 1]);
    largest = Math.max(largest ?? 0, (gap * n) / (b - a));
  }
  return largest;
}

/**
 * Gathers the facts about a run's file.
 *
 * @param problem the test problem
 * @param run the run on its grid
 * @param file arrays as read
 * @param measured what the scoring of the run knows: intervals, u* of the first field at its nodes, norms
 * @returns facts, each null where it does not apply
 * @example readFacts(problem, run, file, { intervals, exact, norms, exactMax, values: "point" })
 * @see the page /scoring, "Findings"
 */
export function readFacts(
  problem: ProblemDefinition,
  run: RunFields,
  file: FieldFile,
  measured: {
    intervals: readonly number[];
    exact: GridValues;
    norms: Norms;
    exactMax: number;
    values: "point" | "cellAverage";
  },
): RunReading {
  const { exact, exactMax, norms } = measured;
  const arrays = run.fields.map((field) => field.array);
  const isWide = arrays.every((array) => array.numberType !== "float32" && array.numberType !== "complex64");
  const offsets = run.axes.flatMap((axis) => (axis.offset === null ? [] : [axis.offset]));
  const errorOverMax = exactMax > 0 ? norms.max / exactMax : norms.max;
  const isMeasurable = (norms.relL2 ?? norms.l2) > roundOffLevel;
  const isMistakable = isMeasurable && measured.values === "point";
  const digits = arrays.map((array) => mostSignificantDigits(array.values));
  const equalsExact = errorOverMax <= 8 * machineEpsilon;
  return {
    format: file.format,
    numberType: arrays[0].numberType,
    coordinateOffset: offsets.length > 0 ? Math.max(...offsets) : null,
    wasReversed: run.axes.some((axis) => axis.isDescending),
    hadRepeatedEnd: run.axes.some((axis) => axis.hasRepeatedEnd),
    holdsSinglePrecisionOnly: isWide && arrays.every((array) => holdsSinglePrecision(array.values)),
    significantDigits: digits.some((count) => count === null)
      ? null
      : Math.max(...digits.map((count) => count ?? 0)),
    errorOverMax,
    interpolantError: equalsExact ? interpolantError(problem, run, exact, exactMax) : null,
    endIncludedError: isMistakable ? endIncludedError(problem, run) : null,
    transposedError: isMistakable ? transposedError(run, exact) : null,
    timeShift: isMistakable ? findTimeShift(problem, run) : null,
    largestGap: largestGap(run),
    sample: sampleValues(run, measured.intervals, exact.values),
  };
}
