import { recordHref } from "@/app/components/instrument/ranking-words";
import { CopyButton } from "@/app/components/ui/copy-button";
import { formatRecordNumber } from "@/app/components/ui/figures";
import type { RecordView } from "@/app/features/submissions/submission-view";

/** How a record is cited: by its permanent address. */
export function CiteBlock({ view }: { view: RecordView }) {
  const { record, team, solver, version, problem, listedAt } = view;
  const citation =
    `${team.name} (${listedAt.getUTCFullYear()}), ${solver.slug} ${version.version} on ${problem.code} ` +
    `revision ${problem.revision}. Backsight, record ${formatRecordNumber(record.number)}, ` +
    `version ${record.version}. ${recordHref(record)}`;
  return (
    <details className="citeb">
      <summary className="btn pri">Cite</summary>
      <div className="mt-2 border border-hair bg-sheet px-3.5 py-2.5 text-14">
        <p className="mb-1.5">{citation}</p>
        <CopyButton text={citation} label="Copy the citation" />
      </div>
    </details>
  );
}
