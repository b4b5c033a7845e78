import { recordHref } from "@/app/components/instrument/ranking-words";
import { Notice } from "@/app/components/ui/notice";
import type { RecordView } from "@/app/features/submissions/submission-view";

/** What a reader must know before trusting this version. */
export function RecordNotices({ view }: { view: RecordView }) {
  const withdrawn = view.decisions.findLast((decision) => decision.kind === "withdraw");
  return (
    <>
      {view.state === "withdrawn" ? (
        <Notice tone="warn">
          This record is withdrawn{withdrawn?.note ? `: ${withdrawn.note}` : "."} The rankings leave it out;
          its figures and checksums stay.
        </Notice>
      ) : null}
      {view.supersededBy ? (
        <Notice tone="warn">
          A newer version stands at{" "}
          <a href={recordHref(view.supersededBy)}>{recordHref(view.supersededBy)}</a>. This one keeps its
          address and its figures.
        </Notice>
      ) : null}
      {view.problem.isCurrentRevision ? null : (
        <Notice tone="warn">
          Its figures are on revision {view.problem.revision} of{" "}
          <a href={`/problems/${view.problem.slug}`}>{view.problem.code}</a>, which has a later one.
        </Notice>
      )}
    </>
  );
}
