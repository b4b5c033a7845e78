import type { ProblemSummary, ProblemView } from "@/app/features/problems/problem-view";
import { toCsv } from "./csv";

export function toProblemSummaryJson(problem: ProblemSummary) {
  return {
    slug: problem.slug,
    code: problem.code,
    title: problem.title,
    revision: problem.revision,
    classification: problem.classification,
    axes: problem.axes,
    boundaryKinds: problem.boundaryKinds,
    records: problem.records,
    families: problem.families,
    best: problem.best && { tolerance: 1e-6, norm: "l2", measure: "nodes", ...problem.best },
    url: `/api/v1/problems/${problem.slug}`,
  };
}

export function toProblemsCsv(problems: ProblemSummary[]): string {
  return toCsv<ProblemSummary>(
    {
      slug: (problem) => problem.slug,
      code: (problem) => problem.code,
      title: (problem) => problem.title,
      revision: (problem) => problem.revision,
      domain: (problem) => problem.classification.domain,
      dimension: (problem) => problem.classification.dimension,
      isSteady: (problem) => problem.classification.isSteady,
      isLinear: (problem) => problem.classification.isLinear,
      records: (problem) => problem.records,
      bestNodes: (problem) => problem.best?.nodes ?? null,
    },
    problems,
  );
}

export function toProblemJson(problem: ProblemView) {
  return {
    slug: problem.slug,
    code: problem.code,
    title: problem.title,
    revision: problem.revision,
    isCurrent: problem.isCurrent,
    publishedAt: problem.publishedAt,
    definition: problem.definition,
    proof: problem.proof,
    revisions: problem.revisions.map(({ number, state, publishedAt, whatChanged }) => ({
      number,
      state,
      publishedAt,
      whatChanged,
    })),
  };
}
