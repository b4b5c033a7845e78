import { Ledger } from "@/app/components/ui/ledger";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Finding } from "@/benchmarks/scoring/result";
import { FileRow } from "./file-row";
import type { RowsAction, UploadRow } from "./upload-rows";
import type { Checked } from "./use-file-checks";

export interface FilesState {
  rows: UploadRow[];
  answers: ReadonlyMap<string, Checked>;
  /** Of the declaration or from the server, by file name. */
  refusals: Refusal[];
  findings: Finding[];
  /** Share of each file that has gone out; null while nothing is being sent. */
  shares: ReadonlyMap<string, number> | null;
}

interface FilesLedgerProps extends FilesState {
  onChange: (action: RowsAction) => void;
}

export function FilesLedger({ rows, answers, refusals, findings, shares, onChange }: FilesLedgerProps) {
  if (rows.length === 0) return null;
  return (
    <Ledger caption="Files and what was read" isCaptionHidden className="mt-4 max-md:block">
      <thead className="max-md:hidden">
        <tr>
          <th scope="col">File</th>
          <th scope="col" className="num">
            N
          </th>
          <th scope="col" className="num">
            Bytes
          </th>
          <th scope="col">SHA-256</th>
          <th scope="col">Role</th>
          <th scope="col">State</th>
          <th scope="col" className="num">
            Wall time, declared
          </th>
          <th scope="col">
            <span className="sr-only">Action</span>
          </th>
        </tr>
      </thead>
      <tbody className="max-md:block">
        {rows.map((row) => (
          <FileRow
            key={row.name}
            row={row}
            answer={answers.get(row.name)}
            refusals={refusals.filter((refusal) => refusal.file === row.name)}
            findings={findingsOf(row, answers.get(row.name), findings)}
            share={shares?.get(row.name) ?? null}
            isSending={shares !== null}
            onChange={onChange}
          />
        ))}
      </tbody>
    </Ledger>
  );
}

/** Findings name their run by its nodes. */
function findingsOf(row: UploadRow, answer: Checked | undefined, findings: Finding[]): Finding[] {
  if (!answer || answer === "fault" || !answer.score) return [];
  const nodes = answer.score.n.join();
  return findings.filter((finding) => finding.run?.join() === nodes && row.role === "study");
}
