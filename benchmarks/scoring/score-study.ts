/** The studies of a submission and what they bring to light. */

import { gridConvergenceIndex } from "../convergence/grid-convergence-index";
import { workingPrecision } from "../convergence/judge-study";
import { assembleStudy } from "../convergence/refinement-study";
import type { ProblemDefinition } from "../problems/definition";
import { geometricMean } from "./declared-grid";
import type { Declaration, RunDeclaration } from "./declaration";
import { exactFunctional } from "./functional";
import type {
  Finding,
  GridConvergence,
  LadderShare,
  MeasureName,
  Norms,
  RelativeNormName,
  RunScore,
  Study,
  StudyPoint,
} from "./result";
import { findInRuns } from "./run-findings";
import { findInStudy } from "./study-findings";

/** One run with what was declared of it. */
export interface ScoredRun {
  declaration: RunDeclaration;
  score: RunScore;
}

const norms: { relative: RelativeNormName; absolute: "l1" | "l2" | "max" }[] = [
  { relative: "relL2", absolute: "l2" },
  { relative: "relL1", absolute: "l1" },
  { relative: "relMax", absolute: "max" },
];

const lastTime = (run: ScoredRun) => run.score.times[run.score.times.length - 1];

/** The error that a study is made of: relative, or absolute where the problem ranks on absolute norms. */
function errorOf(
  problem: ProblemDefinition,
  measured: Norms | null,
  norm: (typeof norms)[number],
): number | null {
  if (!measured) return null;
  return problem.ranksOnAbsoluteNorms ? measured[norm.absolute] : measured[norm.relative];
}

function pointsOf(
  problem: ProblemDefinition,
  runs: readonly ScoredRun[],
  norm: (typeof norms)[number],
  measure: MeasureName,
): StudyPoint[] {
  const points = new Map<string, StudyPoint>();
  for (const run of runs) {
    const error = errorOf(problem, lastTime(run)[measure], norm);
    if (run.declaration.role !== "study" || error === null) continue;
    const { n, nodes, unknowns, intervals, axisIntervals } = run.score;
    const { wallSeconds } = run.declaration;
    const key = n.join("x");
    if (!points.has(key))
      points.set(key, { n, nodes, intervals, axisIntervals, error, unknowns, wallSeconds });
  }
  return [...points.values()];
}

/** The share of the error that is not spatial: its change along each ladder, relative to the study run's error. */
function laddersOf(
  problem: ProblemDefinition,
  runs: readonly ScoredRun[],
  points: readonly StudyPoint[],
  norm: (typeof norms)[number],
  measure: MeasureName,
): LadderShare[] {
  const shares: LadderShare[] = [];
  for (const role of ["timeStep", "iteration"] as const) {
    for (const point of points) {
      const steps = runs.filter(
        (run) => run.declaration.role === role && run.score.n.join("x") === point.n.join("x"),
      );
      const changes = steps.flatMap((run) => {
        const error = errorOf(problem, lastTime(run)[measure], norm);
        return error === null ? [] : [Math.abs(error - point.error)];
      });
      if (changes.length === 0) continue;
      const share = point.error > 0 ? Math.max(...changes) / point.error : 0;
      shares.push({ role, n: point.n, share });
    }
  }
  return shares;
}

/** The grid convergence index of the functional on the three finest runs of the study. */
function convergenceOf(
  problem: ProblemDefinition,
  runs: readonly ScoredRun[],
  study: Study,
): GridConvergence | null {
  const finest = study.points.slice(-3).reverse();
  if (finest.length < 3) return null;
  const values = finest.map((point) => {
    const run = runs.find((one) => one.declaration.role === "study" && one.score.n === point.n);
    return run?.score.functional ?? null;
  });
  const [fine, middle, coarse] = values;
  if (fine === null || middle === null || coarse === null) return null;
  const r21 = finest[0].intervals / finest[1].intervals;
  const r32 = finest[1].intervals / finest[2].intervals;
  if (!(r21 > 1 && r32 > 1)) return null;
  const exact = exactFunctional(problem);
  const trueError = exact === null || exact === 0 ? null : Math.abs((fine - exact) / exact);
  // A functional that the scheme conserves differs between grids by rounding alone, which has no order.
  const isConserved = Math.max(Math.abs(fine - middle), Math.abs(middle - coarse)) <= 1e-12 * Math.abs(fine);
  const index = isConserved ? null : gridConvergenceIndex([fine, middle, coarse], r21, r32);
  return {
    order: index?.order ?? null,
    extrapolated: index?.extrapolated ?? null,
    index: index?.index ?? null,
    trueError,
    isCovered: index === null || trueError === null ? null : index.index >= trueError,
  };
}

/**
 * Assembles the studies of a submission, one for each norm and measure, and its findings.
 *
 * @param problem the test problem
 * @param declaration what the submission declares
 * @param runs every run, in any order; runs of roles `timeStep` and `iteration` are ladders
 * @returns the headline study (relative L2 at the nodes), all studies, and findings
 * @throws RangeError where there are no runs
 * @example scoreStudy(problem, declaration, runs).study.order // 4.01
 * @see the page /scoring, "A refinement study" and "Findings"
 */
export function scoreStudy(
  problem: ProblemDefinition,
  declaration: Declaration,
  runs: readonly ScoredRun[],
): { study: Study; studies: Study[]; findings: Finding[] } {
  if (runs.length === 0) throw new RangeError("A study needs one run or more");
  const eps = workingPrecision[declaration.precision];
  const length = geometricMean(problem.axes.map(({ a, b }) => b - a));
  const measures: MeasureName[] = runs.some((run) => lastTime(run).between)
    ? ["nodes", "between"]
    : ["nodes"];
  const studies = measures.flatMap((measure) =>
    norms.map((norm) => {
      const points = pointsOf(problem, runs, norm, measure);
      const settings = { norm: norm.relative, measure, eps, claim: declaration.claim, length };
      const study = assembleStudy(points, settings);
      study.ladders = laddersOf(problem, runs, study.points, norm, measure);
      return study;
    }),
  );
  const [study] = studies;
  const convergence = convergenceOf(problem, runs, study);
  for (const one of studies) one.gridConvergence = convergence;
  const studyRuns = runs
    .filter((run) => run.declaration.role === "study")
    .sort((p, q) => p.score.intervals - q.score.intervals);
  const findings = [
    ...findInStudy(problem, declaration, study, studyRuns),
    ...runs.flatMap((run) => findInRuns(declaration, run)),
  ];
  return { study, studies, findings };
}
