import type { ScoreAnswer } from "@/app/features/scoring/score-files.server";
import type { Finding, RunScore, Study } from "@/benchmarks/scoring/result";

/** A run's result; what only the findings rest on stays inside. */
export function toRunScoreJson(score: RunScore) {
  return {
    n: score.n,
    nodes: score.nodes,
    unknowns: score.unknowns,
    intervals: score.intervals,
    times: score.times,
    massDefect: score.massDefect,
    relMassDefect: score.relMassDefect,
    boundary: score.boundary,
    takacs: score.takacs,
    maxNearEnds: score.maxNearEnds,
    maxInside: score.maxInside,
    functional: score.functional,
  };
}

export function toStudyJson(study: Study) {
  return {
    norm: study.norm,
    measure: study.measure,
    pairOrders: study.pairOrders,
    kind: study.kind,
    order: study.order,
    orderInterval: study.orderInterval,
    rate: study.rate,
    tail: study.tail,
    verdict: study.verdict,
    leadingCoefficient: study.leadingCoefficient,
    marks: study.marks,
    points: study.points.map(({ n, nodes, intervals, error, unknowns, wallSeconds }) => ({
      n,
      nodes,
      intervals,
      error,
      unknowns,
      wallSeconds,
    })),
    gridConvergence: study.gridConvergence,
    ladders: study.ladders,
  };
}

export function toFindingJson({ code, severity, message, run, figures }: Finding) {
  return { code, severity, message, run, figures };
}

export function toScoreJson(answer: ScoreAnswer) {
  return {
    problem: answer.problem,
    revision: answer.revision,
    scorer: answer.scorer,
    runs: answer.runs.map(toRunScoreJson),
    study: toStudyJson(answer.study),
    studies: answer.studies.map(toStudyJson),
    findings: answer.findings.map(toFindingJson),
  };
}
