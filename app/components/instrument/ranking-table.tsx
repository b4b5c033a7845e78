import type { CSSProperties } from "react";
import {
  errorShare,
  type FrameScales,
  labelledTicks,
  nodesShare,
  nodeTicks,
} from "@/app/components/charts/chart-frame";
import { formatTolerance } from "@/app/components/ui/figures";
import type { Ranking } from "@/app/features/rankings/ranking";
import { NotReachedLine } from "./not-reached-line";
import { percentOf } from "./percent";
import { readingPlace } from "./ranking-chart";
import { RankingLine } from "./ranking-line";

interface RankingTableProps {
  ranking: Ranking;
  scales: FrameScales;
}

/** Its middle column lies exactly under the plot; a plumb line falls from each reading to the row that it decides. */
export function RankingTable({ ranking, scales }: RankingTableProps) {
  const curves = new Map(ranking.curves.map((curve) => [curve.submissionId, curve]));
  const places = ranking.rows.map((row) =>
    nodesShare(scales, readingPlace(row, curves.get(row.submissionId), ranking.tolerance)),
  );
  const tolerance = formatTolerance(ranking.tolerance);
  const line = { "--fy": errorShare(scales, ranking.tolerance).toFixed(5) } as CSSProperties;
  return (
    <table className="rank" role="table" style={line}>
      <caption className="sr-only">
        Submissions to {ranking.problem.code} ranked by nodes needed at the tolerance line
      </caption>
      <Head tolerance={tolerance} scales={scales} places={places} />
      <tbody>
        {ranking.rows.map((row, index) => (
          <RankingLine
            key={row.submissionId}
            row={row}
            place={places[index]}
            index={index}
            tolerance={tolerance}
          />
        ))}
        <tr className="cut">
          <td colSpan={11}>
            does not reach {tolerance}
            <i>{ranking.notReached.length === 0 ? "every submission shown reaches this line" : ""}</i>
          </td>
        </tr>
        {ranking.notReached.map((row) => (
          <NotReachedLine
            key={row.submissionId}
            row={row}
            curve={curves.get(row.submissionId)}
            tolerance={ranking.tolerance}
          />
        ))}
      </tbody>
    </table>
  );
}

interface HeadProps {
  tolerance: string;
  scales: FrameScales;
  places: number[];
}

function Head({ tolerance, scales, places }: HeadProps) {
  return (
    <thead>
      <tr role="row">
        <th className="rk" scope="col">
          <span className="sr-only">Rank</span>
        </th>
        <th className="sv" scope="col">
          Solver
        </th>
        <th className="tm" scope="col">
          Team
        </th>
        <th className="nn" scope="col">
          Nodes at
          <br />
          <span className="font-figure">{tolerance}</span>
        </th>
        <th className="tk" scope="col">
          <span className="sr-only">Place on the nodes scale</span>
          <NodesScale scales={scales} places={places} />
        </th>
        <th className="mt" scope="col">
          Method
        </th>
        <th className="fo num" scope="col">
          Formal
          <br />
          order
        </th>
        <th className="ob num" scope="col">
          Observed
          <br />
          <i>p</i> or <i>q</i>
        </th>
        <th className="vd" scope="col">
          Verdict
        </th>
        <th className="fl num" scope="col">
          Round-off floor
        </th>
        <th className="rc" scope="col">
          Record
        </th>
      </tr>
    </thead>
  );
}

/** The plot's nodes scale once more, in the head that stays in sight. */
function NodesScale({ scales, places }: { scales: FrameScales; places: number[] }) {
  const ticks = labelledTicks(nodeTicks(scales), 420);
  return (
    <svg height="22" width="100%" aria-hidden="true">
      {places.map((place, index) => (
        <line key={index} className="plumb" x1={percentOf(place)} x2={percentOf(place)} y1="-16" y2="32" />
      ))}
      {ticks.map((n) => {
        const share = nodesShare(scales, n);
        const x = percentOf(share);
        return (
          <g key={n}>
            <line x1={x} x2={x} y1="16" y2="22" stroke="var(--ink-3)" />
            <text
              className="c-tick"
              x={x}
              y="12"
              textAnchor={share < 0.02 ? "start" : share > 0.97 ? "end" : "middle"}
            >
              {n}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
