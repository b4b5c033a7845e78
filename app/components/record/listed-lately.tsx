import { observedOf, recordHref, verdictNames } from "@/app/components/instrument/ranking-words";
import { formatRecordNumber, formatShortDay } from "@/app/components/ui/figures";
import type { RecordSummary } from "@/app/features/submissions/submission-view";

export function ListedLately({ records }: { records: RecordSummary[] }) {
  return (
    <section className="sec" aria-labelledby="lately">
      <div className="lh">
        <h2 id="lately">Listed lately</h2>
        <p>
          <a href="/records">all records</a>
        </p>
      </div>
      {records.length === 0 ? (
        <p className="none">
          <b>No record yet</b>
          <span>A submission stands here once an admin has listed it.</span>
        </p>
      ) : (
        <ul className="chg">
          {records.map((record) => (
            <li key={record.id}>
              <time dateTime={record.listedAt.toISOString()}>{formatShortDay(record.listedAt)}</time>
              <span>
                <a href={recordHref(record.record)}>{record.solver.slug}</a> on {record.problem.code}: record{" "}
                <span className="fig">{formatRecordNumber(record.record.number)}</span>
                {record.record.version > 1 ? `, version ${record.record.version}` : ""}
                <Observed observed={record.observed} />.
              </span>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

function Observed({ observed }: { observed: RecordSummary["observed"] }) {
  const figure = observed ? observedOf(observed) : null;
  if (!observed || !figure) return null;
  return (
    <>
      , <i>{figure.symbol}</i> {figure.value} {verdictNames[observed.verdict]}
    </>
  );
}
