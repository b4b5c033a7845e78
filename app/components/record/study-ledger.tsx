import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RunView, SubmissionView } from "@/app/features/submissions/submission-view";
import type { Study } from "@/benchmarks/scoring/result";

/** Error norms and defects at each grid of the study, with the order of each pair. */
export function StudyLedger({ view }: { view: SubmissionView }) {
  const runs = view.runs.filter((run) => run.role === "study").toSorted((a, b) => nodesOf(a) - nodesOf(b));
  const hasBetween = runs.some((run) => lastTime(run)?.between);
  const hasBoundary = runs.some((run) => (run.score?.boundary.length ?? 0) > 0);
  return (
    <Ledger caption="Error norms and defects at each grid" isCaptionHidden>
      <thead>
        <tr>
          <Head>N</Head>
          <Head>L1</Head>
          <Head>L2</Head>
          <Head>max</Head>
          {hasBetween ? <Head>L2 between</Head> : null}
          <Head>Order of pair</Head>
          <Head>Mass defect</Head>
          {hasBoundary ? <Head>Boundary defect</Head> : null}
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => {
          const time = lastTime(run);
          return (
            <tr key={run.id}>
              <th scope="row" className="num">
                {formatNodes(run.n)}
              </th>
              <Cell value={time?.nodes.relL1 ?? time?.nodes.l1} />
              <Cell value={time?.nodes.relL2 ?? time?.nodes.l2} />
              <Cell value={time?.nodes.relMax ?? time?.nodes.max} />
              {hasBetween ? <Cell value={time?.between?.relL2 ?? time?.between?.l2} /> : null}
              <td className="num font-semibold">{pairOrder(view.study, run.n)}</td>
              <Cell value={run.score?.relMassDefect} digits={2} />
              {hasBoundary ? <Cell value={largestResidual(run)} digits={2} /> : null}
            </tr>
          );
        })}
      </tbody>
    </Ledger>
  );
}

function Head({ children }: { children: string }) {
  return (
    <th scope="col" className="num">
      {children}
    </th>
  );
}

function Cell({ value, digits = 4 }: { value: number | null | undefined; digits?: number }) {
  const shown =
    value === null || value === undefined ? "—" : formatError(digits === 2 ? Math.abs(value) : value, digits);
  return <td className="num">{shown}</td>;
}

const nodesOf = (run: RunView) => run.n.reduce((product, count) => product * count, 1);

function lastTime(run: RunView) {
  return run.score?.times.at(-1);
}

/** Of the pair that ends at this grid. */
function pairOrder(study: Study | null, n: number[]): string {
  const at = study?.points.findIndex((point) => point.n.join() === n.join()) ?? -1;
  const order = study?.pairOrders[at - 1];
  return order === undefined || !Number.isFinite(order) ? "" : order.toFixed(2);
}

function largestResidual(run: RunView): number | null {
  const residuals = run.score?.boundary.map((end) => Math.abs(end.residual)) ?? [];
  return residuals.length === 0 ? null : Math.max(...residuals);
}
