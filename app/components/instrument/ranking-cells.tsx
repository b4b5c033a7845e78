import { FamilyMark } from "@/app/components/ui/family-mark";
import { familyNames } from "@/app/components/ui/family-names";
import { formatError, formatRecordNumber } from "@/app/components/ui/figures";
import type { RankedSubmission } from "@/app/features/rankings/ranking";
import { cutMiddle, formalOrderText, observedOf, recordHref, verdictNames } from "./ranking-words";

interface CellProps {
  row: RankedSubmission;
  /** Carried to the record. */
  tolerance: string;
}

/** Solver and team: the left of the plot. */
export function WhoCells({ row, tolerance }: CellProps) {
  const { slug } = row.solver;
  const shown = cutMiddle(slug);
  return (
    <>
      <th scope="row" className="sv" role="rowheader">
        <FamilyMark family={row.family} className="chip" />
        <span className="sr-only">{familyNames[row.family]} </span>
        <span className="nm">
          <a href={`${recordHref(row.record)}?tolerance=${tolerance}`}>
            {shown === slug ? (
              slug
            ) : (
              <>
                <span aria-hidden="true">{shown}</span>
                <span className="fulln">{slug}</span>
              </>
            )}
          </a>
        </span>
        {row.precision === "float32" ? <span className="prec">single</span> : null}
      </th>
      <td className="tm" role="cell" title={row.team.name}>
        {row.team.name}
      </td>
    </>
  );
}

/** Method to record: the right of the plot. */
export function HowWellCells({ row, tolerance }: CellProps) {
  const observed = observedOf(row.observed);
  return (
    <>
      <td className="mt" role="cell" title={row.method}>
        {row.method}
      </td>
      <td className="fo num" role="cell">
        {row.claim.kind === "exponential" ? <i>exp.</i> : formalOrderText(row.claim)}
      </td>
      <td className="ob num" role="cell">
        {observed ? (
          <>
            <i>{observed.symbol}</i> {observed.value}
          </>
        ) : (
          "—"
        )}
      </td>
      <td className="vd" role="cell" data-v={row.observed.verdict}>
        {verdictNames[row.observed.verdict]}
      </td>
      <td className="fl num" role="cell">
        {row.tail?.kind === "floor" ? formatError(row.tail.level) : <span className="nil">not reached</span>}
      </td>
      <td className="rc" role="cell">
        <a href={`${recordHref(row.record)}?tolerance=${tolerance}`}>
          <span className="sr-only">Record </span>
          {formatRecordNumber(row.record.number)}
        </a>
      </td>
    </>
  );
}
