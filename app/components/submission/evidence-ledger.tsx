import { formatBytes, formatNodes, formatSeconds } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RunView } from "@/app/features/submissions/submission-view";
import { roleNames } from "./role-names";

/** The stored files, each with the checksum taken while it arrived. */
export function EvidenceLedger({ runs }: { runs: RunView[] }) {
  return (
    <Ledger caption="Files" isCaptionHidden>
      <thead>
        <tr>
          <th scope="col">File</th>
          <th scope="col" className="num">
            N
          </th>
          <th scope="col" className="num">
            Bytes
          </th>
          <th scope="col">SHA-256</th>
          <th scope="col">Read as</th>
          <th scope="col">Role</th>
          <th scope="col" className="num">
            Wall time, declared
          </th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => (
          <tr key={run.id}>
            <th scope="row" className="fig whitespace-nowrap">
              <a href={`/files/${run.id}`} download={run.file.name}>
                {run.file.name}
              </a>
            </th>
            <td className="num">{formatNodes(run.n)}</td>
            <td className="num">{formatBytes(run.file.sizeBytes)}</td>
            <td className="fig min-w-[250px] text-13 break-all text-ink-2">
              <b className="font-semibold text-ink">{run.file.sha256.slice(0, 8)}</b>
              {run.file.sha256.slice(8)}
            </td>
            <td>
              {run.score ? `${run.score.reading.format.toUpperCase()}, ${run.score.reading.numberType}` : ""}
            </td>
            <td>{roleNames[run.role]}</td>
            <td className="num">{run.wallSeconds === null ? "" : formatSeconds(run.wallSeconds)}</td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}
