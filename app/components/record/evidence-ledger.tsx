import { formatCount, formatNodes, formatSeconds } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RunView } from "@/app/features/submissions/submission-view";
import type { RunRole } from "@/drizzle/enums";

const roleNames: Record<RunRole, string> = {
  study: "study",
  timeStep: "time-step ladder",
  iteration: "iteration ladder",
};

/** Each stored file with its checksum: what every figure leads back to. */
export function EvidenceLedger({ runs }: { runs: RunView[] }) {
  return (
    <Ledger caption="Files" isCaptionHidden className="stack">
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
            dt
          </th>
          <th scope="col" className="num">
            Wall time, declared
          </th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => (
          <tr key={run.id}>
            <th scope="row" className="fig">
              <a href={`/files/${run.id}`}>{run.file.name}</a>
            </th>
            <td className="num" data-l="N">
              {formatNodes(run.n)}
            </td>
            <td className="num" data-l="Bytes">
              {formatCount(run.file.sizeBytes)}
            </td>
            <td className="hash" data-l="SHA-256">
              <span>
                <b>{run.file.sha256.slice(0, 8)}</b>
                {run.file.sha256.slice(8)}
              </span>
            </td>
            <td data-l="Read as">
              {run.score
                ? `${run.score.reading.format.toUpperCase()}, ${run.score.reading.numberType}`
                : "not read"}
            </td>
            <td data-l="Role">{roleNames[run.role]}</td>
            <td className="num" data-l="dt">
              {run.dt === null ? "—" : Number(run.dt.toPrecision(3))}
            </td>
            <td className="num" data-l="Wall time, declared">
              {run.wallSeconds === null ? "—" : formatSeconds(run.wallSeconds)}
            </td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}
