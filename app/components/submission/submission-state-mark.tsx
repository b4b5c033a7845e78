import { submissionMarks, submissionStateNames } from "@/app/components/record/state-words";
import { StateMark } from "@/app/components/ui/state-mark";
import type { SubmissionState } from "@/drizzle/enums";

export function SubmissionStateMark({ state }: { state: SubmissionState }) {
  return <StateMark state={submissionMarks[state]}>{submissionStateNames[state]}</StateMark>;
}
