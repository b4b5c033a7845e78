import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import { StateMark } from "@/app/components/ui/state-mark";
import type { RunView } from "@/app/features/submissions/submission-view";
import { roleNames } from "./role-names";

/** How far each run is, before there is a study of them. */
export function RunStates({ runs }: { runs: RunView[] }) {
  return (
    <Ledger caption="Runs" isCaptionHidden>
      <thead>
        <tr>
          <th scope="col" className="num">
            N
          </th>
          <th scope="col">File</th>
          <th scope="col">Role</th>
          <th scope="col" className="num">
            L2
          </th>
          <th scope="col" className="num">
            max
          </th>
          <th scope="col">State</th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => {
          const norms = run.score?.times.at(-1)?.nodes;
          return (
            <tr key={run.id}>
              <th scope="row" className="num">
                {formatNodes(run.n)}
              </th>
              <td className="fig">{run.file.name}</td>
              <td>{roleNames[run.role]}</td>
              <td className="num">{norms ? formatError(norms.relL2 ?? norms.l2, 4) : ""}</td>
              <td className="num">{norms ? formatError(norms.relMax ?? norms.max, 4) : ""}</td>
              <td>
                <RunState run={run} />
              </td>
            </tr>
          );
        })}
      </tbody>
    </Ledger>
  );
}

function RunState({ run }: { run: RunView }) {
  if (run.state === "scored") return <StateMark state="ok">scored</StateMark>;
  if (run.state === "refused") return <StateMark state="refused">refused</StateMark>;
  return <StateMark state="running">waits</StateMark>;
}
