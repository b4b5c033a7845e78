/** One refinement study, assembled from the errors of its runs. */

import type { Claim } from "../scoring/declaration";
import type { Mark, MeasureName, RelativeNormName, Study, StudyPoint } from "../scoring/result";
import { judgeClaim } from "./judge-claim";
import { judgeStudy, type StudyJudgement } from "./judge-study";
import { nodesForTolerance } from "./nodes-for-tolerance";
import { fitLine, median, observedOrder } from "./observed-order";

/** Logarithms take at least this error. */
const leastError = 1e-18;
/** Axis refinement ratios may differ by this much. */
const axisRatioSlack = 0.05;
/** Marks are kept at 10^(-k/2) for k up to this. */
const lastMark = 28;

/** What a study is assembled with. */
export interface StudySettings {
  norm: RelativeNormName;
  measure: MeasureName;
  /** Working precision of the data. */
  eps: number;
  claim: Claim;
  /** Length of the domain: geometric mean over the axes, in the unit of the axes. */
  length: number;
}

/**
 * True where the axes of a 2-D study are refined by ratios that differ by more than 5 %.
 *
 * @example areAxesRefinedApart(points) // false
 * @see Roache 1998, chapter 5 (grids refined alike along each axis)
 */
export function areAxesRefinedApart(points: readonly StudyPoint[]): boolean {
  for (let k = 1; k < points.length; k++) {
    const ratios = points[k].axisIntervals.map((count, axis) => count / points[k - 1].axisIntervals[axis]);
    if (Math.max(...ratios) / Math.min(...ratios) > 1 + axisRatioSlack) return true;
  }
  return false;
}

/** Slope of ln E against nodes per axis over a window of runs: the rate q of exponential decay. */
function decayRate(
  points: readonly StudyPoint[],
  errors: readonly number[],
  window: [number, number],
): number {
  const runs = points.slice(window[0], window[1]);
  const nodesPerAxis = runs.map((point) => point.nodes ** (1 / point.n.length));
  return fitLine(
    nodesPerAxis,
    errors.slice(window[0], window[1]).map((error) => Math.log(error)),
  ).fall;
}

function intervalOf(pairOrders: readonly number[], window: [number, number]): [number, number] {
  const inside = pairOrders.slice(window[0], window[1] - 1);
  return [Math.min(...inside), Math.max(...inside)];
}

/** C = E/h^p on the finest run before the tail, p the formal order. */
function leadingCoefficient(
  points: readonly StudyPoint[],
  tail: StudyJudgement["tail"],
  settings: StudySettings,
): number | null {
  if (settings.claim.kind !== "algebraic") return null;
  const finest = (tail ? tail.start : points.length) - 1;
  if (finest < 0) return null;
  const { error, intervals } = points[finest];
  return error / (settings.length / intervals) ** settings.claim.order;
}

function marksOf(study: Pick<Study, "points" | "tail">): Mark[] {
  const marks: Mark[] = [];
  for (let k = 0; k <= lastMark; k++) {
    const tolerance = 10 ** (-k / 2);
    const reading = nodesForTolerance(study, tolerance);
    if (reading.kind === "reached") marks.push({ tolerance, nodes: reading.nodes, atMost: reading.atMost });
  }
  return marks;
}

function tailOf(points: readonly StudyPoint[], tail: StudyJudgement["tail"]): Study["tail"] {
  if (!tail) return null;
  const level = median(points.slice(tail.start).map((point) => point.error));
  return { kind: tail.kind, from: points[tail.start].n, level };
}

/**
 * Assembles the study of one norm and measure.
 *
 * Kind, order, tail and verdict follow the rule of the page /scoring. Where the axes of a 2-D study are refined apart
 * no order is quoted and the verdict is undecidable.
 *
 * @param points runs of role `study`, one for each n, in any order
 * @param settings norm, measure, precision, claim and length of the domain
 * @returns the study; without points or with one run its kind is `none`
 * @example assembleStudy(points, settings).order // 4.01
 * @see Roache 1998; Krueger et al. 2019 (the leading coefficient); the page /scoring, "A refinement study"
 */
export function assembleStudy(points: readonly StudyPoint[], settings: StudySettings): Study {
  const sorted = [...points].sort((p, q) => p.intervals - q.intervals);
  const { norm, measure, eps, claim } = settings;
  const study: Study = {
    norm,
    measure,
    points: sorted,
    pairOrders: [],
    kind: "none",
    order: null,
    orderInterval: null,
    rate: null,
    tail: null,
    verdict: claim.kind === "none" ? "none" : "undecidable",
    leadingCoefficient: null,
    marks: [],
    gridConvergence: null,
    ladders: [],
  };
  if (sorted.length < 2) return { ...study, marks: sorted.length > 0 ? marksOf(study) : [] };
  const s = sorted.map((point) => point.intervals);
  const errors = sorted.map((point) => Math.max(point.error, leastError));
  const formal = claim.kind === "algebraic" ? claim.order : null;
  const judged = judgeStudy(s, errors, eps, formal);
  study.tail = tailOf(sorted, judged.tail);
  study.leadingCoefficient = leadingCoefficient(sorted, judged.tail, settings);
  study.marks = marksOf(study);
  study.kind = judged.kind;
  if (areAxesRefinedApart(sorted)) {
    return { ...study, kind: judged.kind === "floor" ? "floor" : "undecided", leadingCoefficient: null };
  }
  study.pairOrders = errors.slice(1).map((_, k) => observedOrder(s, errors, k, k + 1));
  study.order = judged.order;
  study.verdict = judgeClaim(s, errors, eps, claim);
  const { kind, window } = judged;
  if (window && (kind === "algebraic" || kind === "mixed") && window[1] - window[0] >= 2) {
    study.orderInterval = intervalOf(study.pairOrders, window);
  }
  if (window && kind === "exponential" && window[1] - window[0] >= 2) {
    study.rate = decayRate(sorted, errors, window);
  }
  return study;
}
