import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import { StateMark } from "@/app/components/ui/state-mark";
import type { RunView } from "@/app/features/submissions/submission-view";
import type { Study } from "@/benchmarks/scoring/result";
import { roleNames } from "./role-names";

/** Each run with its relative norms at the last output time, coarse to fine. */
export function RunsLedger({ runs, study }: { runs: RunView[]; study: Study | null }) {
  const ordered = [...runs].sort((a, b) => nodesOf(a) - nodesOf(b));
  return (
    <Ledger caption="Runs" isCaptionHidden>
      <thead>
        <tr>
          {["N", "L1", "L2", "max", "L2 between", "Order of pair", "Mass defect"].map((label) => (
            <th key={label} scope="col" className="num">
              {label}
            </th>
          ))}
          <th scope="col">State</th>
        </tr>
      </thead>
      <tbody>
        {ordered.map((run) => (
          <RunRow key={run.id} run={run} study={study} />
        ))}
      </tbody>
    </Ledger>
  );
}

function RunRow({ run, study }: { run: RunView; study: Study | null }) {
  const time = run.score?.times.at(-1);
  const figures = [
    time?.nodes.relL1,
    time?.nodes.relL2,
    time?.nodes.relMax,
    time?.between?.relL2,
    run.role === "study" ? pairOrder(run, study) : null,
    run.score?.relMassDefect,
  ];
  return (
    <tr>
      <th scope="row" className="num">
        {formatNodes(run.n)}
      </th>
      {figures.map((figure, column) => (
        <td key={column} className="num">
          {typeof figure === "number" ? formatError(figure, column === 5 ? 2 : 3) : figure}
        </td>
      ))}
      <td>
        <RunState run={run} />
      </td>
    </tr>
  );
}

function RunState({ run }: { run: RunView }) {
  const role = run.role === "study" ? "" : `, ${roleNames[run.role]}`;
  if (run.state === "scored") return <StateMark state="ok">{`scored${role}`}</StateMark>;
  if (run.state === "refused") return <StateMark state="refused">refused</StateMark>;
  return <StateMark state="running">waits</StateMark>;
}

const nodesOf = (run: RunView) => run.n.reduce((product, count) => product * count, 1);

function pairOrder(run: RunView, study: Study | null): string | null {
  const at = study?.points.findIndex((point) => point.n.join() === run.n.join()) ?? -1;
  const order = at > 0 ? study?.pairOrders[at - 1] : undefined;
  return order === undefined || !Number.isFinite(order) ? null : order.toFixed(2);
}
