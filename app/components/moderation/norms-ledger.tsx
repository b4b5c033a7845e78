import { normNames } from "@/app/components/instrument/ranking-words";
import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { Claim } from "@/benchmarks/scoring/declaration";
import type { Study } from "@/benchmarks/scoring/result";

const shownGrids = 3;

/** The finest grids in all norms, with the order of the last pair beside the formal one. */
export function NormsLedger({ studies, claim }: { studies: Study[]; claim: Claim }) {
  const ordered = [...studies].sort((a, b) => rankOf(a) - rankOf(b));
  const finest = studies[0]?.points.slice(-shownGrids) ?? [];
  return (
    <Ledger caption="Errors and orders" isCaptionHidden>
      <thead>
        <tr>
          <th scope="col">Norm</th>
          {finest.map((point) => (
            <th key={point.n.join()} scope="col" className="num">
              N = {formatNodes(point.n)}
            </th>
          ))}
          <th scope="col" className="num">
            Order of
            <br />
            finest pair
          </th>
          <th scope="col" className="num">
            Formal
          </th>
        </tr>
      </thead>
      <tbody>
        {ordered.map((study) => (
          <tr key={study.norm + study.measure}>
            <th scope="row">
              {normNames[study.norm]}
              {study.measure === "between" ? ", between" : ""}
            </th>
            {study.points.slice(-shownGrids).map((point) => (
              <td key={point.n.join()} className="num">
                {formatError(point.error, 3)}
              </td>
            ))}
            <td className="num">{orderOf(study)}</td>
            <td className="num">{claim.kind === "algebraic" ? claim.order : ""}</td>
          </tr>
        ))}
      </tbody>
    </Ledger>
  );
}

/** At the nodes before between them; L1, L2, max. */
function rankOf({ norm, measure }: Study): number {
  return Object.keys(normNames).indexOf(norm) + (measure === "between" ? 3 : 0);
}

function orderOf(study: Study): string {
  const last = study.pairOrders.at(-1);
  return last === undefined || !Number.isFinite(last) ? "" : last.toFixed(2);
}
