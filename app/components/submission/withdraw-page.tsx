import { Form } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Field } from "@/app/components/ui/field";
import { formatRecordNumber } from "@/app/components/ui/figures";
import { Notice } from "@/app/components/ui/notice";
import { TextArea } from "@/app/components/ui/text-area";
import { Sheet } from "@/app/components/layout/sheet";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";

interface WithdrawPageProps {
  submission: SubmissionView;
  refusal: Refusal | undefined;
}

/** Asks for the note that will stand on the withdrawn record. */
export function WithdrawPage({ submission, refusal }: WithdrawPageProps) {
  const { record, solver, problem } = submission;
  const address = record ? `/records/${record.number}/${record.version}` : "/submissions";
  return (
    <Sheet margin={<p className="note">A withdrawn record keeps its page, figures and checksums.</p>}>
      <h1 className="mb-4 text-34">
        Withdraw {record ? `record ${formatRecordNumber(record.number)}` : solver.name}
      </h1>
      <p className="prose mb-4">
        {solver.name} on {problem.title} leaves the ranking. Its page stays at its address with your note as
        the notice. It cannot be listed again.
      </p>
      {refusal?.message ? <Notice tone="bad">{refusal.message}</Notice> : null}
      <Form method="post" action="?withdraw" className="max-w-[64ch]">
        <Field label="Note, shown on the record" error={refusal?.fields.note} hint="Why it is withdrawn.">
          <TextArea name="note" rows={4} required maxLength={4000} defaultValue={refusal?.values.note} />
        </Field>
        <div className="flex items-center gap-4">
          <Button type="submit" variant="danger">
            Withdraw the record
          </Button>
          <a href={address}>Keep it listed</a>
        </div>
      </Form>
    </Sheet>
  );
}
