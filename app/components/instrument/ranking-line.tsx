import type { CSSProperties } from "react";
import { FamilyGlyph } from "@/app/components/ui/family-mark";
import { formatCount, formatTotalNodes } from "@/app/components/ui/figures";
import type { RankingRow } from "@/app/features/rankings/ranking";
import { percentOf } from "./percent";
import { HowWellCells, WhoCells } from "./ranking-cells";

interface RankingLineProps {
  row: RankingRow;
  /** Along the nodes scale, from 0 to 1. */
  place: number;
  index: number;
  tolerance: string;
}

export function RankingLine({ row, place, index, tolerance }: RankingLineProps) {
  return (
    <tr role="row" className="hit">
      <td className="rk" role="cell">
        {row.rank}
        {row.isTied ? "=" : ""}
      </td>
      <WhoCells row={row} tolerance={tolerance} />
      <td className="nn" role="cell">
        {row.atMost ? (
          <span className="most">
            <span aria-hidden="true">≤</span>
            <span className="sr-only">at most </span>
          </span>
        ) : null}
        {formatCount(row.nodes)}
      </td>
      <td className="tk" role="cell">
        <Track row={row} place={place} index={index} />
      </td>
      <HowWellCells row={row} tolerance={tolerance} />
    </tr>
  );
}

function Track({ row, place, index }: Omit<RankingLineProps, "tolerance">) {
  const x = percentOf(place);
  const isRight = place < 0.62;
  const said =
    row.n.length > 1 ? formatTotalNodes(row.n) : row.atMost ? "at most: below on the coarsest grid" : null;
  const style = { "--x": x, "--k": index } as CSSProperties;
  return (
    <div className="trk" style={style}>
      <i className={row.atMost ? "plumb-line at-most" : "plumb-line"} />
      <svg width="100%" height="34" aria-hidden="true">
        <line className="t-lead" x1="0" x2={x} y1="17" y2="17" />
        <svg x={x} y="0" overflow="visible">
          <FamilyGlyph family={row.family} x={0} y={17} />
        </svg>
      </svg>
      {said ? <span className={isRight ? "said right" : "said left"}>{said}</span> : null}
    </div>
  );
}
