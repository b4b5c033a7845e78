import { familyNames } from "@/app/components/ui/family-names";
import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { RankingCurve } from "@/app/features/rankings/ranking";

/** The chart's figures for those who do not see it, or want them. */
export function PlottedPoints({ curves }: { curves: RankingCurve[] }) {
  return (
    <details className="pts">
      <summary>The plotted points as a table</summary>
      <Ledger caption="Plotted points" isCaptionHidden className="mt-2.5">
        <thead>
          <tr>
            <th scope="col">Solver</th>
            <th scope="col">Family</th>
            <th scope="col">N: error</th>
          </tr>
        </thead>
        <tbody>
          {curves.map((curve) => (
            <tr key={curve.submissionId}>
              <th scope="row" className="fig whitespace-nowrap">
                {curve.label}
              </th>
              <td className="whitespace-nowrap">{familyNames[curve.family]}</td>
              <td className="fig">
                {curve.points
                  .map(({ n, error }) => `${formatNodes(n)}:\u00a0${formatError(error)}`)
                  .join(", ")}
              </td>
            </tr>
          ))}
        </tbody>
      </Ledger>
    </details>
  );
}
