import type { MarkState } from "@/app/components/ui/state-mark";
import type { SubmissionState } from "@/drizzle/enums";

export const submissionStateNames: Record<SubmissionState, string> = {
  draft: "draft",
  checking: "checking",
  scored: "scored",
  inReview: "in review",
  listed: "listed",
  returned: "returned",
  superseded: "superseded",
  withdrawn: "withdrawn",
  failed: "failed",
};

export const submissionMarks: Record<SubmissionState, MarkState> = {
  draft: "none",
  checking: "running",
  scored: "ok",
  inReview: "running",
  listed: "listed",
  returned: "finding",
  superseded: "none",
  withdrawn: "withdrawn",
  failed: "refused",
};
