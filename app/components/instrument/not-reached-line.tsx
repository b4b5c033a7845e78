import type { NotReachedRow, RankingCurve } from "@/app/features/rankings/ranking";
import { formatTolerance } from "@/app/components/ui/figures";
import { HowWellCells, WhoCells } from "./ranking-cells";
import { reasonText } from "./ranking-words";

interface NotReachedLineProps {
  row: NotReachedRow;
  curve: RankingCurve | undefined;
  tolerance: number;
}

export function NotReachedLine({ row, curve, tolerance }: NotReachedLineProps) {
  const text = formatTolerance(tolerance);
  return (
    <tr role="row" className="miss">
      <td className="rk" role="cell">
        –
      </td>
      <WhoCells row={row} tolerance={text} />
      <td className="nn" role="cell">
        —
      </td>
      <td className="tk" role="cell">
        <span className="why">{reasonText(row, tolerance, curve)}</span>
      </td>
      <HowWellCells row={row} tolerance={text} />
    </tr>
  );
}
