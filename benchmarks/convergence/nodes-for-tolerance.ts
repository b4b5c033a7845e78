/** The nodes that a tolerance costs, read from the curve of a refinement study. */

import { hermiteValue, invertFalling, monotoneSlopes } from "../interpolation/monotone-cubic";
import type { Study, StudyPoint } from "../scoring/result";

/** What a study says of a tolerance. */
export type Reading =
  | {
      kind: "reached";
      /** Product of `n`. */
      nodes: number;
      /** Nodes along each axis, rounded up. */
      n: number[];
      /** The coarsest run is below the tolerance already. */
      atMost: boolean;
      /** Error of the run from which the error stays at or below the tolerance. */
      errorAtReading: number;
      /** Unknowns by the same reading; equal to `nodes` where every run has as many unknowns as nodes. */
      unknowns: number;
      /** Declared wall time in seconds by the same reading; null where it is not declared or does not grow. */
      cost: number | null;
    }
  | {
      kind: "notReached";
      /** The error that the study stops at. */
      smallestError: number;
      reason: "endsAbove" | "floorAbove" | "stalls" | "risesAgain" | "singleRun";
      /** Nodes along each axis of the run it stops at. */
      at: number[];
    };

/** What of a study a reading needs. */
export type ReadableStudy = Pick<Study, "points" | "tail">;

/** Logarithms take at least this error. */
const leastError = 1e-18;
const logError = (error: number) => Math.log(Math.max(error, leastError));

/** The run at which the walk towards coarser runs starts: the finest, or the best one of a study that ends in a floor. */
function walkStart({ points, tail }: ReadableStudy): number {
  let start = points.length - 1;
  if (tail?.kind !== "floor") return start;
  for (let k = 0; k < points.length; k++) if (points[k].error < points[start].error) start = k;
  return start;
}

/** First and last run of the falling stretch about the pair (k - 1, k). */
function fallingStretch(points: readonly StudyPoint[], k: number): [number, number] {
  let first = k - 1;
  let last = k;
  const y = (i: number) => logError(points[i].error);
  while (first > 0 && y(first - 1) > y(first)) first--;
  while (last < points.length - 1 && y(last + 1) < y(last)) last++;
  return [first, last];
}

/**
 * The abscissa at which ln E takes the tolerance between runs k - 1 and k, on the falling stretch about them.
 *
 * @returns null where the abscissae do not ascend
 */
function readBetween(
  points: readonly StudyPoint[],
  k: number,
  tolerance: number,
  abscissa: (point: StudyPoint) => number | null,
): number | null {
  const [first, last] = fallingStretch(points, k);
  const x: number[] = [];
  const y: number[] = [];
  for (let i = first; i <= last; i++) {
    const value = abscissa(points[i]);
    if (value === null || !(value > 0)) return null;
    if (x.length > 0 && !(Math.log(value) > x[x.length - 1])) return null;
    x.push(Math.log(value));
    y.push(logError(points[i].error));
  }
  if (tolerance === points[k].error) return abscissa(points[k]);
  return Math.exp(invertFalling(x, y, monotoneSlopes(x, y), k - 1 - first, logError(tolerance)));
}

/** Rounds up, forgiving the rounding of logarithms. */
const roundUp = (value: number) => Math.ceil(value * (1 - 1e-12) - 1e-9);

function reachedAt(points: readonly StudyPoint[], k: number, tolerance: number): Reading {
  const point = points[k];
  const errorAtReading = point.error;
  if (k === 0) {
    const { n, nodes, unknowns, wallSeconds } = point;
    return { kind: "reached", nodes, n, atMost: true, errorAtReading, unknowns, cost: wallSeconds };
  }
  const intervals = readBetween(points, k, tolerance, (run) => run.intervals) ?? point.intervals;
  const ratio = intervals / point.intervals;
  const n = point.n.map((count, axis) => {
    const whole = point.axisIntervals[axis];
    return Math.min(count, roundUp(whole * ratio + (count - whole)));
  });
  const nodes = n.reduce((product, count) => product * count, 1);
  const hasOwnUnknowns = points.some((run) => run.unknowns !== run.nodes);
  const unknowns = hasOwnUnknowns
    ? roundUp(readBetween(points, k, tolerance, (run) => run.unknowns) ?? point.unknowns)
    : nodes;
  const cost = readBetween(points, k, tolerance, (run) => run.wallSeconds);
  return { kind: "reached", nodes, n, atMost: false, errorAtReading, unknowns, cost };
}

function whyNotReached({ points, tail }: ReadableStudy, tolerance: number) {
  if (points.length === 1) return "singleRun";
  if (tail?.kind === "floor") return "floorAbove";
  if (points.some((point) => point.error <= tolerance)) return "risesAgain";
  return tail?.kind === "stall" || tail?.kind === "floorOrStall" ? "stalls" : "endsAbove";
}

/**
 * Reads the nodes for a tolerance from a refinement study.
 *
 * The walk starts at the finest run (or, where the tail is a floor, at the run of smallest error) and goes to coarser
 * runs while their error is at most the tolerance. Between the run it ends at and the next coarser one, ln E over ln s
 * is a monotone cubic on the falling stretch about them. Each axis is scaled by the same ratio of intervals and rounded
 * up. Nothing is extrapolated.
 *
 * @param study points coarse to fine, and the tail
 * @param tolerance relative error, positive
 * @returns the reading, or why there is none and the error that the study stops at
 * @throws RangeError where the study has no points or the tolerance is not positive
 * @example nodesForTolerance(study, 1e-6)
 * @see Fritsch and Carlson 1980 (the interpolant); the page /scoring, "Nodes for a tolerance"
 */
export function nodesForTolerance(study: ReadableStudy, tolerance: number): Reading {
  const { points } = study;
  if (points.length === 0) throw new RangeError("A reading needs a study of one run or more");
  if (!(tolerance > 0)) throw new RangeError(`A tolerance is a positive number, not ${tolerance}`);
  const start = walkStart(study);
  if (!(points[start].error <= tolerance)) {
    const { error, n } = points[start];
    return { kind: "notReached", smallestError: error, reason: whyNotReached(study, tolerance), at: n };
  }
  let k = start;
  while (k > 0 && points[k - 1].error <= tolerance) k--;
  return reachedAt(points, k, tolerance);
}

/** Nodes per axis, as a geometric mean, when a run is scaled to `intervals`. */
function nodesPerAxis(point: StudyPoint, intervals: number): number {
  const ratio = intervals / point.intervals;
  const product = point.n.reduce((all, count, axis) => {
    const whole = point.axisIntervals[axis];
    return all * (whole * ratio + (count - whole));
  }, 1);
  return product ** (1 / point.n.length);
}

/**
 * The curve that `nodesForTolerance` reads from, for drawing: every run and about `samples` places between them.
 *
 * On falling stretches it is the monotone cubic in both logarithms; elsewhere the runs are joined by straight lines.
 *
 * @param study points coarse to fine, and the tail
 * @param samples places to spread evenly over ln s
 * @returns nodes per axis (geometric mean, not rounded) and error, by ascending nodes
 * @example curvePoints(study, 120)
 * @see Fritsch and Carlson 1980
 */
export function curvePoints(
  study: ReadableStudy,
  samples: number,
): { nodesPerAxis: number; error: number }[] {
  const { points } = study;
  const curve = points.slice(0, 1).map((point) => ({
    nodesPerAxis: nodesPerAxis(point, point.intervals),
    error: point.error,
  }));
  if (points.length < 2) return curve;
  const whole = Math.log(points[points.length - 1].intervals / points[0].intervals);
  for (let k = 1; k < points.length; k++) {
    const isFalling = logError(points[k].error) < logError(points[k - 1].error);
    const [first, last] = isFalling ? fallingStretch(points, k) : [k - 1, k];
    const stretch = points.slice(first, last + 1);
    const x = stretch.map((point) => Math.log(point.intervals));
    const y = stretch.map((point) => logError(point.error));
    const slopes = monotoneSlopes(x, y);
    const from = Math.log(points[k - 1].intervals);
    const width = Math.log(points[k].intervals) - from;
    const pieces = Math.max(1, Math.round((samples * width) / whole));
    for (let i = 1; i < pieces; i++) {
      const at = from + (width * i) / pieces;
      const error = Math.exp(hermiteValue(x, y, slopes, at));
      curve.push({ nodesPerAxis: nodesPerAxis(points[k], Math.exp(at)), error });
    }
    curve.push({ nodesPerAxis: nodesPerAxis(points[k], points[k].intervals), error: points[k].error });
  }
  return curve;
}
