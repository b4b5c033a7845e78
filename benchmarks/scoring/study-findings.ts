/** Findings about a study: computed with the score, each with the figures that led to it. None refuses anything. */

import { fitLine } from "../convergence/observed-order";
import { areAxesRefinedApart } from "../convergence/refinement-study";
import type { ProblemDefinition } from "../problems/definition";
import type { Declaration, RunDeclaration } from "./declaration";
import type { Finding, RunScore, Study, StudyPoint } from "./result";

const machineEpsilon = 2 ** -52;

interface StudyRun {
  declaration: RunDeclaration;
  score: RunScore;
}

const digits = (value: number, count = 3) => Number(value.toPrecision(count)).toString();
const spokenNodes = (n: readonly number[]) => n.join(" x ");

function finding(
  code: string,
  severity: Finding["severity"],
  message: string,
  figures: Finding["figures"],
  run: number[] | null = null,
): Finding {
  return { code, severity, message, run, figures };
}

function findInGrids(points: readonly StudyPoint[]): Finding[] {
  const findings: Finding[] = [];
  if (points.length < 3) {
    const message = `The study has ${points.length} ${points.length === 1 ? "grid" : "different grids"}; an order needs three or more.`;
    findings.push(finding("fewer-than-three-grids", "warning", message, { grids: points.length }));
  }
  for (let k = 1; k < points.length; k++) {
    const ratio = points[k].intervals / points[k - 1].intervals;
    if (ratio >= 1.1) continue;
    const message = `The grids ${spokenNodes(points[k - 1].n)} and ${spokenNodes(points[k].n)} differ by a ratio of ${digits(ratio, 4)}; orders over ratios below 1.1 are mostly noise.`;
    findings.push(finding("small-refinement-ratio", "note", message, { ratio }, points[k].n));
  }
  if (areAxesRefinedApart(points)) {
    const message = "The axes are refined by ratios that differ by more than 5 %, so no order is quoted.";
    findings.push(finding("axes-refined-apart", "warning", message, {}));
  }
  return findings;
}

/** First run that round-off may have reached: rises from there on say nothing. */
function floorStart({ points, tail }: Study): number {
  if (tail?.kind !== "floor" && tail?.kind !== "floorOrStall") return points.length;
  const from = points.findIndex((point) => point.n === tail.from);
  return from < 0 ? points.length : from;
}

function findRises(study: Study, eps: number): Finding[] {
  const { points } = study;
  const end = floorStart(study);
  const findings: Finding[] = [];
  for (let k = 1; k < end; k++) {
    const [coarse, fine] = [points[k - 1], points[k]];
    const isAtRoundOff = fine.error <= 1e3 * eps;
    if (fine.error <= 1.1 * coarse.error || isAtRoundOff) continue;
    const message = `The error rises from ${digits(coarse.error)} on ${spokenNodes(coarse.n)} to ${digits(fine.error)} on ${spokenNodes(fine.n)} nodes.`;
    const figures = { coarse: coarse.error, fine: fine.error };
    findings.push(finding("error-not-falling", "warning", message, figures, fine.n));
  }
  return findings;
}

function findInCurve(declaration: Declaration, study: Study): Finding[] {
  const findings: Finding[] = [];
  if (study.tail?.kind === "stall") {
    const { level, from } = study.tail;
    const message = `From ${spokenNodes(from)} nodes on the error stays at about ${digits(level)}, above round-off: something other than the grid decides it, such as the time step, an iteration tolerance or a boundary closure.`;
    findings.push(finding("stall", "warning", message, { level }, from));
  }
  const { claim } = declaration;
  if (claim.kind === "algebraic" && study.orderInterval && study.order !== null) {
    const above = study.pairOrders.filter((order) => order > claim.order + 0.5).length;
    if (study.order > claim.order + 0.5 && above >= 2) {
      const message = `The observed order ${digits(study.order)} is above the formal order ${claim.order} over ${above} pairs.`;
      const figures = { observed: study.order, formal: claim.order, pairs: above };
      findings.push(finding("order-above-formal", "warning", message, figures));
    }
  }
  for (const ladder of study.ladders) {
    if (!(ladder.share > 0.01)) continue;
    const what = ladder.role === "timeStep" ? "time step" : "iteration tolerance";
    const message = `On ${spokenNodes(ladder.n)} nodes the error changes by ${digits(100 * ladder.share)} % with the ${what}: that share of it is not spatial.`;
    const figures = { role: ladder.role, share: ladder.share };
    findings.push(finding("non-spatial-error", "warning", message, figures, ladder.n));
  }
  return findings;
}

function findExactRuns(runs: readonly StudyRun[]): Finding[] {
  const equal = runs.filter(({ score }) => score.reading.errorOverMax <= 8 * machineEpsilon);
  if (equal.length < 2) return [];
  const worst = Math.max(...equal.map(({ score }) => score.reading.interpolantError ?? 0));
  const cannotCarry = worst > 1e-6;
  const grids = equal.map(({ score }) => spokenNodes(score.n)).join(", ");
  const message =
    `On ${equal.length} grids (${grids}) the values equal the exact solution to 8 eps` +
    (cannotCarry
      ? `, though the interpolant of u* on one of them misses it by ${digits(worst)} between the nodes.`
      : ".");
  const figures = { grids: equal.length, interpolantError: cannotCarry ? worst : null };
  return [finding("equals-exact", cannotCarry ? "strong" : "note", message, figures)];
}

/** Values of one run at the nodes it shares with another, as far as both were sampled. */
function sharedValues(a: RunScore, b: RunScore): { u: number; v: number; error: number }[] {
  const [first, second] = [a.reading.sample, b.reading.sample];
  if (!first || !second) return [];
  const columns = (score: RunScore, stride: number, axis: number) => Math.ceil(score.n[axis] / stride);
  const pairsAlong = (axis: number) => {
    const [p, q] = [first.strides[axis], second.strides[axis]];
    const pairs: [number, number][] = [];
    for (let i = 0; i < columns(a, p, axis); i++) {
      const place = (i * p * b.axisIntervals[axis]) / a.axisIntervals[axis] / q;
      if (Number.isInteger(place) && place < columns(b, q, axis)) pairs.push([i, place]);
    }
    return pairs;
  };
  const axes = a.n.map((_, axis) => pairsAlong(axis));
  const last = axes.length - 1;
  const widthA = columns(a, first.strides[last], last);
  const widthB = columns(b, second.strides[last], last);
  const rows: [number, number][] = axes.length === 2 ? axes[0] : [[0, 0]];
  return rows.flatMap(([i, k]) =>
    axes[last].map(([j, l]) => ({
      u: first.values[i * widthA + j],
      v: second.values[k * widthB + l],
      error: Math.abs(first.errors[i * widthA + j]),
    })),
  );
}

/** True where nodes of two grids of one kind coincide at equal fractions of their intervals. */
const sharesByFraction = (declaration: Declaration, problem: ProblemDefinition) =>
  problem.axes.every((axis) => {
    const kind = declaration.grid[axis.name]?.kind;
    return kind === "uniform-periodic" || kind === "uniform" || kind === "chebyshev-lobatto";
  });

function findSubsampled(
  problem: ProblemDefinition,
  declaration: Declaration,
  runs: readonly StudyRun[],
): Finding[] {
  if (!sharesByFraction(declaration, problem)) return [];
  const findings: Finding[] = [];
  for (let k = 0; k < runs.length; k++) {
    for (let m = k + 1; m < runs.length; m++) {
      const [a, b] = [runs[k].score, runs[m].score];
      if (a.n.join() === b.n.join()) continue;
      const shared = sharedValues(a, b);
      const slack = 16 * machineEpsilon * a.exactMax;
      const areEqual = shared.every(({ u, v }) => Math.abs(u - v) <= slack);
      // Where both runs hold the exact value, as on a boundary or by symmetry, agreement says nothing.
      const telling = shared.filter(({ error }) => error > slack).length;
      const errors = [a, b].map((score) => score.times[score.times.length - 1].nodes.relL2 ?? 0);
      if (telling < 3 || !areEqual || Math.min(...errors) <= 1e-10) continue;
      const message = `The runs of ${spokenNodes(a.n)} and ${spokenNodes(b.n)} nodes agree to 16 eps at the ${shared.length} shared nodes that were compared: one looks like a selection from the other, not a computation of its own.`;
      findings.push(
        finding("subsampled", "strong", message, { nodes: shared.length, with: spokenNodes(a.n) }, b.n),
      );
    }
  }
  return findings;
}

/** Fall of ln E against ln s. */
const slopeOf = (s: readonly number[], errors: readonly number[]) =>
  fitLine(
    s.map((value) => Math.log(value)),
    errors.map((value) => Math.log(value)),
  ).fall;

function findEndIncluded(runs: readonly StudyRun[]): Finding[] {
  const used = runs.flatMap(({ score }) => {
    const { relL2 } = score.times[score.times.length - 1].nodes;
    const { endIncludedError: other } = score.reading;
    return relL2 && other ? [{ s: score.intervals, error: relL2, other }] : [];
  });
  if (used.length < 2) return [];
  const asDeclared = slopeOf(
    used.map(({ s }) => s),
    used.map(({ error }) => error),
  );
  const asIncluded = slopeOf(
    used.map(({ s }) => s - 1),
    used.map(({ other }) => other),
  );
  const isFirstOrder = asDeclared > 0.7 && asDeclared < 1.4;
  if (!isFirstOrder || !(asIncluded > asDeclared + 0.5)) return [];
  const message = `The error falls at order ${digits(asDeclared)} as declared, and at order ${digits(asIncluded)} when each file is read as n - 1 intervals with the end node included. A periodic grid leaves the end node out.`;
  return [finding("end-node-included", "warning", message, { declared: asDeclared, included: asIncluded })];
}

function findFallingCost(points: readonly StudyPoint[]): Finding[] {
  const findings: Finding[] = [];
  for (let k = 1; k < points.length; k++) {
    const [before, after] = [points[k - 1].wallSeconds, points[k].wallSeconds];
    if (before === null || after === null || !(after < before / 2)) continue;
    const message = `The declared wall time falls from ${digits(before)} s on ${spokenNodes(points[k - 1].n)} to ${digits(after)} s on ${spokenNodes(points[k].n)} nodes.`;
    findings.push(finding("cost-falls", "note", message, { before, after }, points[k].n));
  }
  return findings;
}

/**
 * Findings that need the whole study.
 *
 * @param problem the test problem
 * @param declaration what the submission declares
 * @param study the headline study
 * @param runs runs of role `study`, coarse to fine
 * @returns findings in the order of the page /scoring
 * @example findInStudy(problem, declaration, study, runs).map(({ code }) => code)
 * @see the page /scoring, "Findings"
 */
export function findInStudy(
  problem: ProblemDefinition,
  declaration: Declaration,
  study: Study,
  runs: readonly StudyRun[],
): Finding[] {
  const eps = declaration.precision === "float32" ? 2 ** -23 : machineEpsilon;
  return [
    ...findInGrids(study.points),
    ...findRises(study, eps),
    ...findInCurve(declaration, study),
    ...findExactRuns(runs),
    ...findSubsampled(problem, declaration, runs),
    ...findEndIncluded(runs),
    ...findFallingCost(study.points),
  ];
}
