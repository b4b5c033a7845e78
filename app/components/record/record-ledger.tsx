import { observedOf, recordHref, verdictNames } from "@/app/components/instrument/ranking-words";
import { FamilyMark } from "@/app/components/ui/family-mark";
import { familyNames } from "@/app/components/ui/family-names";
import { formatDay, formatRecordNumber } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RecordSummary } from "@/app/features/submissions/submission-view";

export function RecordLedger({ records }: { records: RecordSummary[] }) {
  return (
    <Ledger caption="Records" isCaptionHidden className="stack">
      <thead>
        <tr>
          <th scope="col">Record</th>
          <th scope="col">Solver</th>
          <th scope="col">Team</th>
          <th scope="col">Test problem</th>
          <th scope="col">Family</th>
          <th scope="col">Method</th>
          <th scope="col" className="num">
            Observed <i>p</i> or <i>q</i>
          </th>
          <th scope="col">Verdict</th>
          <th scope="col">Listed</th>
        </tr>
      </thead>
      <tbody>
        {records.map((record) => (
          <RecordLine key={record.id} record={record} />
        ))}
      </tbody>
    </Ledger>
  );
}

function RecordLine({ record }: { record: RecordSummary }) {
  const observed = record.observed ? observedOf(record.observed) : null;
  return (
    <tr>
      <th scope="row" className="fig">
        <a href={recordHref(record.record)}>
          {formatRecordNumber(record.record.number)}
          {record.record.version > 1 ? `/${record.record.version}` : ""}
        </a>
      </th>
      <td className="fig font-medium" data-l="Solver">
        <span>
          {record.solver.slug} <span className="font-normal text-ink-2">{record.version}</span>
        </span>
      </td>
      <td data-l="Team">{record.team.name}</td>
      <td data-l="Test problem">
        <a href={`/problems/${record.problem.slug}`}>
          <span className="fig">{record.problem.code}</span> {record.problem.title}
        </a>
      </td>
      <td className="whitespace-nowrap" data-l="Family">
        <span>
          <FamilyMark family={record.family} className="mr-1.5 align-[-2px]" />
          {familyNames[record.family]}
        </span>
      </td>
      <td className="quiet" data-l="Method">
        {record.method}
      </td>
      <td className="num" data-l="Observed order or rate">
        {observed ? `${observed.symbol} ${observed.value}` : "—"}
      </td>
      <td data-l="Verdict">{record.observed ? verdictNames[record.observed.verdict] : "—"}</td>
      <td className="whitespace-nowrap" data-l="Listed">
        {formatDay(record.listedAt)}
      </td>
    </tr>
  );
}
