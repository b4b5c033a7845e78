import { formatDay } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RevisionSummary } from "@/app/features/problems/problem-view";

export function RevisionLedger({ slug, revisions }: { slug: string; revisions: RevisionSummary[] }) {
  return (
    <section className="sec" id="revisions" aria-labelledby="revisions-heading">
      <h2 id="revisions-heading" className="mb-3">
        Revisions
      </h2>
      <Ledger caption="Revisions" isCaptionHidden>
        <thead>
          <tr>
            <th scope="col">No.</th>
            <th scope="col">Date</th>
            <th scope="col">State</th>
            <th scope="col" className="w-3/5">
              What changed
            </th>
          </tr>
        </thead>
        <tbody>
          {revisions.map((revision) => (
            <tr key={revision.number}>
              <th scope="row" className="fig">
                <a href={`/problems/${slug}?revision=${revision.number}`}>{revision.number}</a>
              </th>
              <td className="whitespace-nowrap">
                {revision.publishedAt ? formatDay(revision.publishedAt) : "—"}
              </td>
              <td>{revision.state}</td>
              <td className="small">{revision.whatChanged}</td>
            </tr>
          ))}
        </tbody>
      </Ledger>
    </section>
  );
}
