import type {
  RecordView,
  RunView,
  SubmissionSummary,
  SubmissionView,
} from "@/app/features/submissions/submission-view";
import { toFindingJson, toRunScoreJson, toStudyJson } from "./score-json";

export function toSubmissionJson(submission: SubmissionView) {
  const { declaration } = submission;
  return {
    id: submission.id,
    number: submission.number,
    state: submission.state,
    record: submission.record,
    url: `/api/v1/submissions/${submission.id}`,
    problem: submission.problem.slug,
    revision: submission.problem.revision,
    isCurrentRevision: submission.problem.isCurrentRevision,
    team: submission.team,
    solver: { ...submission.solver, ...submission.version },
    family: submission.family,
    method: submission.method,
    claim: declaration.claim,
    grid: declaration.grid,
    values: declaration.values,
    reconstruction: declaration.reconstruction,
    precision: declaration.precision,
    dataLicence: submission.dataLicence,
    createdAt: submission.createdAt,
    scoredAt: submission.scoredAt,
    handedInAt: submission.handedInAt,
    listedAt: submission.listedAt,
    scorer: submission.scorerVersion,
    runs: submission.runs.map((run) => toRunJson(submission.id, run)),
    study: submission.study && toStudyJson(submission.study),
    studies: submission.studies.map(toStudyJson),
    findings: submission.findings.map(toFindingJson),
    refusals: submission.refusals,
    decisions: submission.decisions.map(({ kind, note, createdAt }) => ({ kind, note, createdAt })),
  };
}

function toRunJson(submissionId: string, run: RunView) {
  const { id, n, role, state, refusal, unknowns, dt, steps, wallSeconds, yardstickSeconds, file } = run;
  return {
    id,
    n,
    role,
    state,
    refusal,
    declared: { unknowns, dt, steps, wallSeconds, yardstickSeconds },
    file: { ...file, url: `/api/v1/submissions/${submissionId}/files/${id}` },
    score: run.score && toRunScoreJson(run.score),
  };
}

export function toRecordJson(record: RecordView) {
  return {
    ...toSubmissionJson(record),
    supersededBy: record.supersededBy,
    versions: record.versions.map(({ number, version, state, listedAt, scorerVersion }) => ({
      number,
      version,
      state,
      listedAt,
      scorer: scorerVersion,
    })),
  };
}

export function toSubmissionSummaryJson(submission: SubmissionSummary) {
  return {
    id: submission.id,
    number: submission.number,
    state: submission.state,
    record: submission.record,
    url: `/api/v1/submissions/${submission.id}`,
    problem: submission.problem.slug,
    team: submission.team,
    solver: { ...submission.solver, version: submission.version },
    family: submission.family,
    method: submission.method,
    runs: submission.runs,
    observed: submission.observed,
    createdAt: submission.createdAt,
    handedInAt: submission.handedInAt,
    listedAt: submission.listedAt,
  };
}
