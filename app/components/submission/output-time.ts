import type { SubmissionView } from "@/app/features/submissions/submission-view";

/** The last one of the scored runs; null for a steady problem. */
export function outputTimeOf(submission: SubmissionView): number | null {
  return submission.runs.find((run) => run.score)?.score?.times.at(-1)?.t ?? null;
}
