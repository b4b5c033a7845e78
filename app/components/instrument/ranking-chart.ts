import { crossingOf, type FramePoint, nodesPerAxisOf, scalesOf } from "@/app/components/charts/chart-frame";
import type { ConvergenceChart } from "@/app/components/charts/convergence-spec";
import type { Curve } from "@/app/components/charts/curve";
import type { Ranking, RankingCurve, RankingRow } from "@/app/features/rankings/ranking";
import { cutMiddle, errorTitle } from "./ranking-words";

/** Over so many, only the leading ones are named and marked. */
export const crowdFrom = 15;
const namedInCrowd = 6;

/** The chart of a ranking: every submission within the filter, the line, and the readings of the rows shown. */
export function chartOfRanking(ranking: Ranking, outputTime: number | null): ConvergenceChart {
  const isCrowd = ranking.curves.length > crowdFrom;
  const rows = new Map(ranking.rows.map((row) => [row.submissionId, row]));
  const names = new Map(
    [...ranking.rows, ...ranking.notReached].map((row) => [row.submissionId, row.solver.slug]),
  );
  const curves = ranking.curves.map((curve, index) =>
    toCurve(
      curve,
      names.get(curve.submissionId),
      rows.get(curve.submissionId),
      isCrowd && index >= namedInCrowd,
    ),
  );
  const points = ranking.curves.flatMap((curve) => [...curve.line, ...curve.points.map(toPoint)]);
  return {
    scales: scalesOf(points, ranking.tolerance),
    curves,
    tolerance: {
      tolerance: ranking.tolerance,
      rings: ranking.rows.flatMap((row) => {
        const curve = ranking.curves.find(({ submissionId }) => submissionId === row.submissionId);
        return row.atMost || !curve ? [] : [readingPlace(row, curve, ranking.tolerance)];
      }),
    },
    slope: null,
    titles: { x: "N, nodes per axis", y: errorTitle(ranking.norm, ranking.measure, outputTime) },
  };
}

/** Nodes per axis at which a row is read, not rounded, so that its mark stands under its ring. */
export function readingPlace(row: RankingRow, curve: RankingCurve | undefined, tolerance: number): number {
  const near = nodesPerAxisOf(row.n);
  return row.atMost || !curve ? near : crossingOf(curve.line, tolerance, near);
}

function toPoint({ n, error }: { n: number[]; error: number }): FramePoint {
  return { nodesPerAxis: nodesPerAxisOf(n), error };
}

function toCurve(
  { submissionId, label, family, points, line }: RankingCurve,
  name: string | undefined,
  row: RankingRow | undefined,
  isThin: boolean,
): Curve {
  const shown = cutMiddle(name ?? label);
  const rank = row ? `${row.rank}${row.isTied ? "=" : ""}` : null;
  return {
    id: submissionId,
    name: label,
    label: isThin ? null : rank ? `${rank} ${shown}` : shown,
    shortLabel: isThin ? null : rank,
    family,
    points: points.map(toPoint),
    line,
    weight: isThin ? "thin" : "normal",
    hasMarks: !isThin,
  };
}
