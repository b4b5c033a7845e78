import { StateMark, type MarkState } from "@/app/components/ui/state-mark";
import type { SubmissionState } from "@/drizzle/enums";

export const stateNames: Record<SubmissionState, string> = {
  draft: "draft",
  checking: "checking",
  scored: "scored, private",
  inReview: "in review",
  listed: "listed",
  returned: "returned",
  superseded: "superseded",
  withdrawn: "withdrawn",
  failed: "not scored",
};

const marks: Record<SubmissionState, MarkState> = {
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

export function SubmissionStateMark({ state }: { state: SubmissionState }) {
  return <StateMark state={marks[state]}>{stateNames[state]}</StateMark>;
}
