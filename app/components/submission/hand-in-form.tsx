import { Form, useNavigation } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";

interface HandInFormProps {
  submission: SubmissionView;
  refusal: Refusal | undefined;
}

/** Hands in for review, after one question; why it cannot be done stands in its place. */
export function HandInForm({ submission, refusal }: HandInFormProps) {
  const isSending = useNavigation().state !== "idle";
  const { permissions, findings } = submission;
  if (!permissions.canHandIn) return <p className="text-14 text-ink-2">{whyNot(submission)}</p>;
  const warnings = findings.filter((finding) => finding.severity !== "note").length;
  return (
    <>
      {refusal?.message ? <Notice tone="bad">{refusal.message}</Notice> : null}
      <details className="text-14">
        <summary className="btn pri inline-block list-none">Hand in for review</summary>
        <Form method="post" className="mt-3 max-w-[64ch] border-l-3 border-ink pl-4">
          <p className="mb-3">
            An admin of another team then sees the figures, the files and the findings
            {warnings > 0 ? ` (${warnings} to explain)` : ""}, and lists the study as a record or returns it
            with a note. Listed files are public for good, under {submission.dataLicence}.
          </p>
          <Button type="submit" disabled={isSending}>
            Hand in S-{submission.number}
          </Button>
        </Form>
      </details>
    </>
  );
}

function whyNot({ state, permissions }: SubmissionView): string {
  if (!permissions.isOwnTeam) return "Its team decides whether it is handed in.";
  switch (state) {
    case "checking":
      return "It can be handed in once it is scored.";
    case "inReview":
      return "It is in review. The decision comes with a note.";
    case "failed":
      return "What is not scored cannot be handed in. Mend the files and send the study again.";
    default:
      return "It cannot be handed in as it stands.";
  }
}
