import { Form, useNavigation } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Field } from "@/app/components/ui/field";
import { Notice } from "@/app/components/ui/notice";
import { TextArea } from "@/app/components/ui/text-area";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";
import { submissionStateNames } from "@/app/components/record/state-words";

interface DecisionFormProps {
  submission: SubmissionView;
  refusal: Refusal | undefined;
}

/** List or return, either with a note; why nobody can decide here stands in its place. */
export function DecisionForm({ submission, refusal }: DecisionFormProps) {
  const isSending = useNavigation().state !== "idle";
  const { permissions, state } = submission;
  if (!permissions.canDecide) {
    return (
      <Notice>
        {state !== "inReview"
          ? `There is nothing to decide: the submission is ${submissionStateNames[state]}.`
          : "The submission is your own team's. Another admin has to decide about it."}
      </Notice>
    );
  }
  return (
    <Form method="post" className="mt-4">
      {refusal?.message ? <Notice tone="bad">{refusal.message}</Notice> : null}
      <Field
        label="Note to the author, kept with the submission"
        hint="Required for either decision."
        error={refusal?.fields.note}
      >
        <TextArea name="note" rows={4} maxLength={4000} defaultValue={refusal?.values.note} />
      </Field>
      <div className="flex flex-wrap items-center gap-2.5">
        <Button type="submit" formAction="?list" disabled={isSending}>
          List
        </Button>
        <Button type="submit" variant="primary" disabled={isSending}>
          Return with this note
        </Button>
        {isSending ? <span className="text-13 text-ink-2">The decision is being stored.</span> : null}
      </div>
    </Form>
  );
}
